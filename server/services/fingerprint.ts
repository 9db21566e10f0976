import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'

/** SHA-256 of the canonical form (RFC 8785): tells whether two requests ask for the same thing. */
export function toFingerprint(content: unknown): string {
  return createHash('sha256')
    .update(canonicalize(content) ?? '')
    .digest('hex')
}
