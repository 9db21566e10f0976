/** Edits of the analysis of a document: load, direction and the design situation they come from. */
import type { AnalysisDocument, MomentCurvatureAnalysis } from '#shared/document/analysisDocument.ts'

/** Changes the analysis by hand; a load or direction typed by hand belongs to no case any more. */
export function editAnalysis(
  document: AnalysisDocument,
  change: Partial<MomentCurvatureAnalysis>,
): AnalysisDocument {
  const byHand = 'axialLoad' in change || 'angle' in change
  const { case: named, ...rest } = document.analysis
  const analysis =
    byHand || named === undefined ? { ...rest, ...change } : { ...rest, case: named, ...change }
  return { ...document, analysis }
}

/** Takes load and direction from the case of that name; an unknown name changes nothing. */
export function chooseCase(document: AnalysisDocument, name: string): AnalysisDocument {
  const chosen = document.cases.find((one) => one.name === name)
  if (!chosen) return document
  const { axialLoad, angle } = chosen
  return { ...document, analysis: { ...document.analysis, axialLoad, angle, case: name } }
}
