/**
 * Older documents are brought to the present format step by step. Every format version that was ever written
 * has its step here and a file in `tests/fixtures/documents`, which is loaded for ever.
 */

export const presentFormat = 'girdwell-analysis/1'
const formatName = 'girdwell-analysis/'

/** From version n (the key) to n + 1. A step gets a copy that it may change. */
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
  const format = input.format ?? `${formatName}1`
  const version =
    typeof format === 'string' && format.startsWith(formatName)
      ? Number(format.slice(formatName.length))
      : Number.NaN
  if (!Number.isInteger(version) || version < 1 || version > present) {
    const allowed = present === 1 ? `${formatName}1` : `${formatName}1 to ${formatName}${present}`
    return { status: 'unknown-format', found: JSON.stringify(format), allowed }
  }
  let document = { ...input }
  for (let from = version; from < present; from++) {
    const step = register[from]
    if (!step)
      throw new Error(`No migration from format ${from} to ${from + 1}, though ${present} is the present one`)
    document = step(document)
  }
  return { status: 'present', document: { ...document, format: `${formatName}${present}` } }
}
