import type { Seen } from '#shared/api.ts'
import type { Issue } from '#shared/document/analysisDocument.ts'
import { seenTolerance } from '#shared/document/seenFigures.ts'
import { formatWithUnit } from '#shared/numberFormat.ts'
import type { QuantityKind } from '#shared/units.ts'

const figures = [
  { name: 'ultimateCurvature', words: 'ultimate curvature', kind: 'curvature' },
  { name: 'ultimateMoment', words: 'ultimate moment', kind: 'moment' },
  { name: 'greatestMoment', words: 'greatest moment', kind: 'moment' },
] as const satisfies { name: keyof Seen; words: string; kind: QuantityKind }[]

/** Where what the browser saw differs from what the server computed; none when they are the same. */
export function compareSeen(seen: Seen, own: Seen): Issue[] {
  const issues: Issue[] = []
  if (seen.digest !== own.digest) {
    issues.push({
      path: 'seen.digest',
      code: 'differs',
      message: 'the digest is of another document',
      found: seen.digest,
      allowed: own.digest,
    })
  }
  for (const { name, words, kind } of figures) {
    if (agree(seen[name], own[name])) continue
    issues.push({
      path: `seen.${name}`,
      code: 'differs',
      message: `the ${words} differs from the server's own`,
      // Eight figures: the tolerance is in the sixth.
      found: formatWithUnit(kind, seen[name], 8),
      allowed: formatWithUnit(kind, own[name], 8),
    })
  }
  return issues
}

function agree(a: number | null, b: number | null): boolean {
  if (a === null || b === null) return a === b
  return Math.abs(a - b) <= seenTolerance * Math.max(Math.abs(a), Math.abs(b))
}
