/** Rules that need more than one field, of a document that is sound in shape. */
import type { AnalysisDocument, Issue } from './analysisDocument.ts'
import { checkAnalysis } from './checkAnalysis.ts'
import { checkBars } from './checkBars.ts'
import { checkMaterials } from './checkMaterials.ts'
import { checkOutline } from './checkOutline.ts'
import { checkSpirals } from './checkSpirals.ts'
import { checkSteelNames } from './checkSteelNames.ts'
import { checkVoids } from './checkVoids.ts'
import type { AnalysisDocumentInput } from './schema.ts'

/** Everything that is wrong, in the order of the fields; `document` is `input` with its defaults filled in. */
export function checkDocument(input: AnalysisDocumentInput, document: AnalysisDocument): Issue[] {
  const { section } = document
  const outline = checkOutline(section.outline)
  // Without a sound outline, inside and outside mean nothing.
  const isSound = outline.length === 0
  return [
    ...outline,
    ...checkVoids(section, isSound),
    ...checkSpirals(section, isSound),
    ...checkBars(section, isSound),
    ...checkSteelNames(document),
    ...checkMaterials(document),
    ...checkAnalysis(input),
  ]
}
