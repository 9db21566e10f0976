/** From anything to a filled, sound analysis document, or to the list of what is wrong with it. */
import type { AnalysisDocument, Issue } from './analysisDocument.ts'
import { checkDocument } from './checkDocument.ts'
import { fillDefaults } from './fillDefaults.ts'
import { describeValue } from './issueWords.ts'
import { migrateDocument } from './migrate.ts'
import { documentSchema } from './schema.ts'
import { toIssues } from './schemaIssues.ts'

export type ReadOutcome = { status: 'read'; document: AnalysisDocument } | { status: 'bad'; issues: Issue[] }

/**
 * Migrates, checks and fills a document handed in as plain data. Never throws on plain data, whatever it holds; a document
 * that was filled reads to itself.
 */
export function readDocument(input: unknown): ReadOutcome {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) {
    return refuse({
      path: '(document)',
      code: 'wrong-type',
      message: 'is not an analysis document',
      found: describeValue(input),
      allowed: 'an object with section, materials and analysis',
    })
  }
  const migrated = migrateDocument(input as Record<string, unknown>)
  if (migrated.status === 'unknown-format') {
    const { found, allowed } = migrated
    return refuse({ path: 'format', code: 'unknown-format', message: 'is not known', found, allowed })
  }
  const parsed = documentSchema.safeParse(migrated.document)
  if (!parsed.success) return { status: 'bad', issues: toIssues(parsed.error.issues, migrated.document) }
  const document = fillDefaults(parsed.data)
  const issues = checkDocument(parsed.data, document)
  return issues.length > 0 ? { status: 'bad', issues } : { status: 'read', document }
}

/** The same for text that may not be JSON, with or without a byte order mark. */
export function parseDocumentText(text: string): ReadOutcome {
  let input: unknown
  try {
    input = JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch (error) {
    return refuse({
      path: '(document)',
      code: 'not-json',
      message: 'is not JSON',
      found: error instanceof Error ? error.message : 'text that cannot be read',
      allowed: 'one JSON object',
    })
  }
  return readDocument(input)
}

/** `path: what is wrong, found, allowed`: one line, whatever the names in the document hold. */
export function formatIssue({ path, message, found, allowed }: Issue): string {
  const parts = [message]
  if (found !== undefined) parts.push(`found ${found}`)
  if (allowed !== undefined) parts.push(`allowed ${allowed}`)
  return `${path}: ${parts.join(', ')}`.replace(/[\s\p{Cc}]+/gu, ' ')
}

function refuse(issue: Issue): ReadOutcome {
  return { status: 'bad', issues: [issue] }
}
