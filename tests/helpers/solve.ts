import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { LimitState } from '#shared/document/analysisResult.ts'
import { formatIssue, readDocument } from '#shared/document/readDocument.ts'
import {
  solveMomentCurvature,
  type MomentCurvatureSolution,
} from '#workers/solver/analyses/momentCurvature.ts'

/** A filled document, or an error that names what is wrong with the test's input. */
export function readSound(input: unknown): AnalysisDocument {
  const read = readDocument(input)
  if (read.status === 'bad') throw new Error(read.issues.map(formatIssue).join('\n'))
  return read.document
}

export function solve(input: unknown, strips?: number): MomentCurvatureSolution {
  return solveMomentCurvature(readSound(input), strips === undefined ? {} : { strips })
}

/** Moment (N·mm) at a curvature (1/mm), on the straight line between rows. */
export function interpolateMoment({ points }: MomentCurvatureSolution, curvature: number): number {
  const row = points.curvature.findIndex((value) => value >= curvature)
  if (row === -1) throw new Error(`The curve ends at ${points.curvature.at(-1)}, before ${curvature}`)
  if (row === 0) return points.moment[0]
  const from = points.curvature[row - 1]
  const t = (curvature - from) / (points.curvature[row] - from)
  return points.moment[row - 1] + t * (points.moment[row] - points.moment[row - 1])
}

export function findLimitState(solution: MomentCurvatureSolution, kind: string, item?: string): LimitState {
  const found = solution.limitStates.find(
    (state) => state.kind === kind && (item === undefined || state.item === item),
  )
  if (!found) throw new Error(`${kind} ${item ?? ''} was not reached; stop: ${solution.stop.reason}`)
  return found
}
