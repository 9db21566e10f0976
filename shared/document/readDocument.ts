/** From anything to a filled, sound analysis document, or to the list of what is wrong with it. */
import { z } from 'zod'
import type { AnalysisDocument, Issue } from './analysisDocument.ts'
import { checkMaterials } from './checkMaterials.ts'
import { checkSection } from './checkSection.ts'
import { fillDefaults } from './fillDefaults.ts'
import { migrateDocument } from './migrate.ts'
import { documentSchema, type AnalysisDocumentInput } from './schema.ts'
import { toIssues } from './schemaIssues.ts'

// No code is made from strings, so that the page's content security policy holds.
z.config({ jitless: true })

export type ReadOutcome = { status: 'read'; document: AnalysisDocument } | { status: 'bad'; issues: Issue[] }

/** Migrates, checks and fills a document handed in as plain data. Never throws, whatever it is given. */
export function readDocument(input: unknown): ReadOutcome {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) {
    return refuse({
      path: '(document)',
      code: 'wrong-type',
      message: 'is not an analysis document',
      found: describe(input),
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
  const loadIssues = checkLoad(parsed.data)
  if (loadIssues.length > 0) return { status: 'bad', issues: loadIssues }
  const document = fillDefaults(parsed.data)
  const issues = [...checkSection(document), ...checkMaterials(document)]
  return issues.length > 0 ? { status: 'bad', issues } : { status: 'read', document }
}

/** The same for text that may not be JSON. */
export function readDocumentText(text: string): ReadOutcome {
  let input: unknown
  try {
    input = JSON.parse(text)
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

/** `path: what is wrong, found, allowed` on one line. */
export function formatIssue({ path, message, found, allowed }: Issue): string {
  const parts = [message]
  if (found !== undefined) parts.push(`found ${found}`)
  if (allowed !== undefined) parts.push(`allowed ${allowed}`)
  return `${path}: ${parts.join(', ')}`.replaceAll('\n', ' ')
}

/** Load and direction come from the analysis itself or from the case it names; both may stand there when they agree. */
function checkLoad({ cases = [], analysis }: AnalysisDocumentInput): Issue[] {
  if (analysis.case === undefined) {
    if (analysis.axialLoad !== undefined) return []
    return [
      {
        path: 'analysis.axialLoad',
        code: 'missing',
        message: 'is missing',
        found: 'nothing',
        allowed: 'a number in N, compression positive, or the name of a case',
      },
    ]
  }
  const named = cases.find((one) => one.name === analysis.case)
  if (!named) {
    return [
      {
        path: 'analysis.case',
        code: 'unknown-case',
        message: 'names a case that is not defined',
        found: JSON.stringify(analysis.case),
        allowed:
          cases.length === 0 ? 'no case is defined' : cases.map((one) => JSON.stringify(one.name)).join(', '),
      },
    ]
  }
  const issues: Issue[] = []
  const mustAgree = (field: 'axialLoad' | 'angle', wanted: number) => {
    const given = analysis[field]
    if (given === undefined || given === wanted) return
    issues.push({
      path: `analysis.${field}`,
      code: 'case-differs',
      message: `differs from the case ${JSON.stringify(named.name)} that the analysis names`,
      found: String(given),
      allowed: `${wanted}, or nothing`,
    })
  }
  mustAgree('axialLoad', named.axialLoad)
  mustAgree('angle', named.angle ?? 0)
  return issues
}

function refuse(issue: Issue): ReadOutcome {
  return { status: 'bad', issues: [issue] }
}

function describe(value: unknown): string {
  if (value === null) return 'null'
  return Array.isArray(value) ? 'a list' : `a ${typeof value}`
}
