/**
 * What the solver's worker answers to. The worker implements this, `src/clients/solverClient.ts` wraps it,
 * the server's verification thread calls the same functions.
 */
import type { Issue } from './document/analysisDocument.ts'
import type { MomentCurvatureResult } from './document/analysisResult.ts'

export type AnalyseReply =
  | { status: 'solved'; result: MomentCurvatureResult }
  /** Sound document, no equilibrium even at zero curvature: a result with empty points. */
  | { status: 'no-equilibrium'; result: MomentCurvatureResult }
  | { status: 'bad-document'; issues: Issue[] }

export interface SolverApi {
  /** Reads, fills, checks and solves a document handed in as plain data. */
  analyse(document: unknown): AnalyseReply
}
