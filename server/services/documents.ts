import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import { InvalidError } from '../errors.ts'

/** The document with every default filled in; throws its issues, each at its own path in the document. */
export function parseDocument(input: unknown): AnalysisDocument {
  const read = readDocument(input)
  if (read.status === 'bad') throw new InvalidError('The document is not sound.', read.issues)
  return read.document
}
