/** The figures by which page and server tell that they speak of the same result. */
import type { Seen } from '../api.ts'
import type { MomentCurvatureResult } from './analysisResult.ts'

/** Relative difference up to which two figures are the same: engines may differ in the last digits of exp and pow. */
export const seenTolerance = 1e-6

/**
 * Digest, ultimate curvature (1/mm) and ultimate moment (N·mm) of the idealised curve, and the greatest moment
 * (N·mm) of the computed one; null where a state was not reached or there is no curve.
 */
export function toSeen(result: MomentCurvatureResult): Seen {
  return {
    digest: result.digest,
    ultimateCurvature: result.idealised.ultimateCurvature,
    ultimateMoment: result.idealised.ultimateMoment,
    greatestMoment: result.points.moment.reduce<number | null>(
      (greatest, moment) => (greatest === null || moment > greatest ? moment : greatest),
      null,
    ),
  }
}
