/** How far two results of one document lie apart: the stored one, and the one computed here. */
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'

export interface ResultComparison {
  /** Largest relative difference; Infinity where the results differ in make. */
  largest: number
  /** Where it is, in words. */
  at: string
  stored: number | null
  recomputed: number | null
  /** Numbers compared. */
  compared: number
}

/** A number counts at least this share of the greatest in its column: beside a great moment a small one is rounding. */
const leastShare = 1e-3

export function compareResults(
  stored: MomentCurvatureResult,
  recomputed: MomentCurvatureResult,
): ResultComparison {
  const outcome: ResultComparison = { largest: 0, at: '', stored: null, recomputed: null, compared: 0 }
  const differs = (at: string) => {
    if (outcome.largest === Infinity) return
    Object.assign(outcome, { largest: Infinity, at, stored: null, recomputed: null })
  }
  const compare = (at: string, a: readonly (number | null)[], b: readonly (number | null)[]) => {
    if (a.length !== b.length) return differs(`${at}: ${a.length} values stored, ${b.length} computed`)
    const greatest = a.reduce<number>((most, value) => Math.max(most, Math.abs(value ?? 0)), 0)
    a.forEach((one, i) => {
      const other = b[i]
      if (one === null || other === null) {
        if (one !== other) differs(`${at}, place ${i + 1}`)
        return
      }
      outcome.compared += 1
      const size = Math.max(Math.abs(one), leastShare * greatest)
      const difference = one === other ? 0 : Math.abs(one - other) / size
      if (difference > outcome.largest) {
        Object.assign(outcome, { largest: difference, at, stored: one, recomputed: other })
      }
    })
  }

  if (stored.digest !== recomputed.digest) differs('the digest of the input')
  const end = ({ stop }: MomentCurvatureResult) => `${stop.reason} ${stop.item ?? ''}`
  if (end(stored) !== end(recomputed)) differs('the reason why the curve ends')

  const { points } = stored
  compare('curvature', points.curvature, recomputed.points.curvature)
  compare('moment', points.moment, recomputed.points.moment)
  compareCrossMoment()
  compare('axial strain', points.axialStrain, recomputed.points.axialStrain)
  compare('neutral axis depth', points.neutralAxisDepth, recomputed.points.neutralAxisDepth)
  compare('cover strain', points.concreteStrain, recomputed.points.concreteStrain)
  for (const [id, values] of Object.entries(points.spiralStrain)) {
    compare(`strain at spiral ${id}`, values, recomputed.points.spiralStrain[id] ?? [])
  }
  for (const key of ['volumetricRatio', 'confiningStress', 'confinedStrength', 'ultimateStrain'] as const) {
    compare(
      `spirals, ${key}`,
      stored.spirals.map((spiral) => spiral[key]),
      recomputed.spirals.map((spiral) => spiral[key]),
    )
  }
  for (const key of ['area', 'confiningStress', 'strength'] as const) {
    compare(
      `zones, ${key}`,
      stored.zones.map((zone) => zone[key]),
      recomputed.zones.map((zone) => zone[key]),
    )
  }
  for (const key of ['curvature', 'moment'] as const) {
    compare(
      `limit states, ${key}`,
      stored.limitStates.map((state) => state[key]),
      recomputed.limitStates.map((state) => state[key]),
    )
  }
  const figures = ({ idealised }: MomentCurvatureResult) => [
    [idealised.firstYieldCurvature, idealised.yieldCurvature, idealised.ultimateCurvature],
    [idealised.firstYieldMoment, idealised.yieldMoment, idealised.ultimateMoment],
    [idealised.ductility],
  ]
  const [a, b] = [figures(stored), figures(recomputed)]
  compare('idealised curve, curvatures', a[0], b[0])
  compare('idealised curve, moments', a[1], b[1])
  compare('ductility', a[2], b[2])
  return outcome

  /** About the other axis there is often nothing but rounding: it counts beside the moment. */
  function compareCrossMoment() {
    const greatest = points.moment.reduce((most, value) => Math.max(most, Math.abs(value)), 0)
    const withGreatest = (values: readonly number[]) => [...values, greatest]
    compare(
      'moment about the other axis',
      withGreatest(points.crossMoment),
      withGreatest(recomputed.points.crossMoment),
    )
  }
}
