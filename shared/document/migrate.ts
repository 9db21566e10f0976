/**
 * Older documents are brought to the present format step by step. Every format version that was ever written
 * has its step here and a file in `tests/fixtures/documents`, which is loaded for ever.
 */

import { describeValue } from './issueWords.ts'

export const presentFormat = 'girdwell-analysis/1'
const formatName = 'girdwell-analysis/'

/** From version n (the key) to n + 1. A step returns a new document and leaves the one it was given as it was. */
export type MigrationSteps = Readonly<
  Record<number, (document: Record<string, unknown>) => Record<string, unknown>>
>

/** Version 1 is the first: nothing to bring forward yet. */
const steps: MigrationSteps = {}

export type Migrated =
  | { status: 'present'; document: Record<string, unknown> }
  /** Not a version that this program can read. */
  | { status: 'unknown-format'; found: string; allowed: string }

/**
 * The document in the present format. An absent `format` means version 1; anything that is not
 * `girdwell-analysis/` with a number from 1 to the present one is refused.
 */
export function migrateDocument(
  input: Record<string, unknown>,
  present = Number(presentFormat.slice(formatName.length)),
  register = steps,
): Migrated {
  const format = input.format === undefined ? `${formatName}1` : input.format
  const version = findVersion(format)
  if (version === undefined || version > present) {
    const allowed = present === 1 ? `${formatName}1` : `${formatName}1 to ${formatName}${present}`
    return { status: 'unknown-format', found: describeValue(format), allowed }
  }
  let document = input
  for (let from = version; from < present; from++) {
    const step = register[from]
    if (!step)
      throw new Error(`No migration from format ${from} to ${from + 1}, though ${present} is the present one`)
    document = step(document)
  }
  return { status: 'present', document: { ...document, format: `${formatName}${present}` } }
}

/** The number behind `girdwell-analysis/`, written as a whole number from 1 on; undefined for anything else. */
function findVersion(format: unknown): number | undefined {
  if (typeof format !== 'string' || !format.startsWith(formatName)) return undefined
  const digits = format.slice(formatName.length)
  return /^[1-9]\d{0,5}$/.test(digits) ? Number(digits) : undefined
}
