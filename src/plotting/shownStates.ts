import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { nameLimitState } from './limitStateNames.ts'

/** One numbered state on the curve; limit states reached together share a number. */
export interface ShownState {
  number: number
  names: string[]
  curvature: number
  moment: number
  axialStrain: number
  /** mm from the most compressed point; null at zero curvature */
  neutralAxisDepth: number | null
  /** over the idealised yield curvature; null without one */
  overYield: number | null
}

/** Relative difference of curvatures that count as one state. */
const together = 1e-6

/** Limit states in the order in which they occur, numbered once for curve, strip and drawing. */
export function listShownStates(result: MomentCurvatureResult): ShownState[] {
  const states: ShownState[] = []
  const { yieldCurvature } = result.idealised
  for (const limit of result.limitStates) {
    const last = states.at(-1)
    if (last && limit.curvature - last.curvature <= together * limit.curvature) {
      last.names.push(nameLimitState(limit))
      continue
    }
    states.push({
      number: states.length + 1,
      names: [nameLimitState(limit)],
      curvature: limit.curvature,
      moment: limit.moment,
      axialStrain: limit.axialStrain,
      neutralAxisDepth: findNeutralAxisDepth(result, limit.curvature),
      overYield: yieldCurvature === null ? null : limit.curvature / yieldCurvature,
    })
  }
  return states
}

function findNeutralAxisDepth({ points }: MomentCurvatureResult, curvature: number): number | null {
  const near = together * (points.curvature.at(-1) ?? 0)
  const row = points.curvature.findIndex((value) => value >= curvature - near)
  return row === -1 ? null : points.neutralAxisDepth[row]
}
