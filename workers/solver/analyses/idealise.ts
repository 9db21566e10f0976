/**
 * Bilinear idealisation of a moment-curvature curve. 1/mm and N·mm.
 *
 * First yield: tension bar at fy/Es or concrete strain 0.002, whichever first; nominal: concrete strain 0.004 or tension
 * bar strain 0.015, whichever first (M. J. N. Priestley, G. M. Calvi, M. J. Kowalsky, "Displacement-based seismic design
 * of structures", IUSS Press 2007; from memory). Equal areas: bridge practice (from memory).
 */
import type { IdealisedCurve, LimitState } from '#shared/document/analysisResult.ts'

export interface CurveColumns {
  curvature: readonly number[]
  moment: readonly number[]
}

export function idealiseCurve(
  rule: IdealisedCurve['rule'],
  curve: CurveColumns,
  limitStates: readonly LimitState[],
  /** The last row is a state of failure, not just where the analysis broke off. */
  ultimateReached: boolean,
): IdealisedCurve {
  const firstYield = limitStates.find(
    (state) => state.kind === 'bar-yield-tension' || state.kind === 'concrete-0.002',
  )
  const nominal = limitStates.find((state) => state.kind === 'concrete-0.004' || state.kind === 'bar-0.015')
  const last = curve.curvature.length - 1
  const ultimateCurvature = ultimateReached ? curve.curvature[last] : null
  const ultimateMoment = ultimateReached ? curve.moment[last] : null
  const none = {
    rule,
    firstYieldCurvature: null,
    firstYieldMoment: null,
    yieldCurvature: null,
    yieldMoment: null,
    ultimateCurvature,
    ultimateMoment,
    ductility: null,
  }
  if (!firstYield) return none
  const { curvature: firstYieldCurvature, moment: firstYieldMoment } = firstYield
  const known = { ...none, firstYieldCurvature, firstYieldMoment }
  if (firstYieldCurvature === 0) {
    return { ...known, ultimateCurvature: null, ultimateMoment: null }
  }
  const yieldMoment =
    rule === 'first-yield-nominal'
      ? (nominal?.moment ?? null)
      : ultimateReached
        ? computeEqualAreaMoment(rule, curve, firstYieldCurvature, firstYieldMoment)
        : null
  if (yieldMoment === null) return known
  const yieldCurvature = (firstYieldCurvature * yieldMoment) / firstYieldMoment
  return {
    ...known,
    yieldMoment,
    yieldCurvature,
    ductility: ultimateCurvature === null ? null : ultimateCurvature / yieldCurvature,
  }
}

/**
 * Plastic moment Mp of the elastic-perfectly-plastic curve through first yield whose area up to the ultimate curvature is
 * that of the curve: Mp = K (phiU - sqrt(phiU^2 - 2 C / K)), K = M'y / phi'y. `from-zero`: C is the whole area;
 * `beyond-yield`: C = area beyond first yield + M'y phi'y / 2. Null where no such curve exists.
 */
export function computeEqualAreaMoment(
  rule: 'equal-area-beyond-yield' | 'equal-area-from-zero',
  { curvature, moment }: CurveColumns,
  firstYieldCurvature: number,
  firstYieldMoment: number,
): number | null {
  const K = firstYieldMoment / firstYieldCurvature
  const phiU = curvature[curvature.length - 1]
  const from = rule === 'equal-area-from-zero' ? 0 : firstYieldCurvature
  const triangle = rule === 'equal-area-from-zero' ? 0 : (firstYieldMoment * firstYieldCurvature) / 2
  const C = computeAreaFrom(curvature, moment, from) + triangle
  const root = phiU * phiU - (2 * C) / K
  return K > 0 && root >= 0 ? K * (phiU - Math.sqrt(root)) : null
}

/** Trapezoids from a curvature on. */
function computeAreaFrom(curvature: readonly number[], moment: readonly number[], from: number): number {
  let area = 0
  for (let i = 1; i < curvature.length; i++) {
    const a = Math.max(from, curvature[i - 1])
    const b = curvature[i]
    if (b <= a) continue
    const slope = (moment[i] - moment[i - 1]) / (b - curvature[i - 1])
    const atA = moment[i - 1] + slope * (a - curvature[i - 1])
    area += ((atA + moment[i]) / 2) * (b - a)
  }
  return area
}
