/** Documents of tests/fixtures/documents, each time anew, so that a test may change what it gets. */
import { existsSync, readFileSync } from 'node:fs'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { AnalysisDocumentInput } from '#shared/document/schema.ts'

const folder = new URL('../fixtures/documents/', import.meta.url)
const sections = new URL('../fixtures/sections/', import.meta.url)

export const fixtureNames = ['format-1', 'one-spiral', 'octagon-hoop'] as const
export type FixtureName = (typeof fixtureNames)[number]

export function loadFixture(file: string): unknown {
  return JSON.parse(readFileSync(new URL(`${file}.json`, folder), 'utf8'))
}

/** Digests by name, made without the program: tests/fixtures/documents/makeDigests.mjs. */
export const fixtureDigests = loadFixture('digests') as Record<string, string>

/** The document of a digest as handed in: one of documents, or the one that stands in a file of sections. */
export function loadDigested(name: string): unknown {
  if (existsSync(new URL(`${name}.json`, folder))) return loadFixture(name)
  const file = readFileSync(new URL(`${name}.json`, sections), 'utf8')
  return (JSON.parse(file) as { document: unknown }).document
}

/** Path of a fixture, for programs that read files. */
export function toFixturePath(file: string): string {
  return new URL(`${file}.json`, folder).pathname
}

/** As handed in: sound, with defaults left out. */
export function loadInput(name: FixtureName = 'one-spiral'): AnalysisDocumentInput {
  return loadFixture(name) as AnalysisDocumentInput
}

/** The document that anything sound reads to. */
export function readSound(input: unknown): AnalysisDocument {
  const read = readDocument(input)
  if (read.status === 'bad')
    throw new Error(`A sound document has no issues; found ${JSON.stringify(read.issues)}`)
  return read.document
}
