/** The solver's front: from anything handed in to a whole result or the issues of the document. */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { computeDigest } from '#shared/document/digest.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { AnalyseReply } from '#shared/solverApi.ts'
import { solveMomentCurvature } from './analyses/momentCurvature.ts'
import { solverVersion } from './version.ts'

/** Reads, fills, checks and solves a document; `clock` tells milliseconds. */
export function analyse(input: unknown, clock: () => number = Date.now): AnalyseReply {
  const read = readDocument(input)
  if (read.status === 'bad') return { status: 'bad-document', issues: read.issues }
  const result = solveDocument(read.document, clock)
  return { status: result.points.curvature.length > 0 ? 'solved' : 'no-equilibrium', result }
}

/** The result of a document that is known to be sound and filled. */
export function solveDocument(document: AnalysisDocument, clock: () => number): MomentCurvatureResult {
  const startedAt = clock()
  const { diagnostics, ...solution } = solveMomentCurvature(document)
  return {
    format: 'girdwell-result/1',
    solver: { version: solverVersion },
    document,
    digest: computeDigest(document),
    ...solution,
    diagnostics: { ...diagnostics, milliseconds: clock() - startedAt },
  }
}
