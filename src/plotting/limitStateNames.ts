/** Words for limit states and for the end of a curve, as they stand on the screen and in print. */
import type { LimitState, MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { formatWithUnit } from '#shared/numberFormat.ts'

/** Short name, for a mark on a curve and the head of a column. */
export function nameLimitState({ kind, item }: Pick<LimitState, 'kind' | 'item'>): string {
  switch (kind) {
    case 'bar-yield-tension':
      return `bars ${item} yield`
    case 'bar-yield-compression':
      return `bars ${item} yield, compressed`
    case 'bar-0.015':
      return `bars ${item} strain 0.015`
    case 'bar-rupture':
      return `bars ${item} rupture`
    case 'concrete-0.002':
      return 'cover strain 0.002'
    case 'concrete-0.003':
      return 'cover strain 0.003'
    case 'concrete-0.004':
      return 'cover strain 0.004'
    case 'spalling':
      return 'cover spalls'
    case 'spiral-fracture':
      return `spiral ${item} fractures`
    case 'void-face':
      return `face of void ${Number(item) + 1} fails`
    case 'peak-moment':
      return 'greatest moment'
    case 'moment-drop-20':
      return 'moment down by 20 %'
  }
}

/** Why a curve ends, as a sentence. */
export function describeStop(result: MomentCurvatureResult): string {
  const { stop, points, document } = result
  const last = points.curvature.at(-1)
  const load = formatWithUnit('force', document.analysis.axialLoad, 5)
  if (last === undefined) {
    return `No equilibrium at ${load}, even without bending. Lower the axial load or enlarge the section.`
  }
  const end = formatWithUnit('curvature', last)
  switch (stop.reason) {
    case 'spiral-fracture':
      return `Spiral ${stop.item} fractures at ${end}.`
    case 'bar-rupture':
      return `Bars ${stop.item} rupture at ${end}.`
    case 'void-face':
      return `The face of void ${Number(stop.item) + 1} fails at ${end}.`
    case 'moment-drop-20':
      return `The moment has dropped by 20 % at ${end}.`
    case 'moment-lost':
      return `The moment is lost at ${end}.`
    case 'no-equilibrium':
      return `No equilibrium beyond ${end} at ${load}.`
    case 'curvature-limit':
      return `No limit state was reached up to ${end}, where the curve was broken off.`
  }
}

/** The governing limit in two or three words. */
export function nameStop({ stop }: Pick<MomentCurvatureResult, 'stop'>): string {
  switch (stop.reason) {
    case 'spiral-fracture':
    case 'bar-rupture':
    case 'void-face':
    case 'moment-drop-20':
      return nameLimitState({ kind: stop.reason, item: stop.item })
    case 'moment-lost':
      return 'moment lost'
    case 'no-equilibrium':
      return 'no equilibrium'
    case 'curvature-limit':
      return 'none reached'
  }
}
