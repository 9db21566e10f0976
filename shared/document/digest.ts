import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js'
import canonicalize from 'canonicalize'
import type { AnalysisDocument } from './analysisDocument.ts'

/** RFC 8785 canonical JSON of what determines the result: title and notes are left out. */
export function toCanonicalJson({ format, section, materials, cases, analysis }: AnalysisDocument): string {
  const text = canonicalize({ format, section, materials, cases, analysis })
  if (text === undefined) throw new Error('A filled document has a canonical form; found none')
  return text
}

/** `sha256:` and 64 hex digits over the canonical form; the same in browser, worker and Node. */
export function computeDigest(document: AnalysisDocument): string {
  return `sha256:${bytesToHex(sha256(utf8ToBytes(toCanonicalJson(document))))}`
}
