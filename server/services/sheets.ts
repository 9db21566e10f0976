import type { Job, Seen, StoredSheet } from '#shared/api.ts'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { toSeen } from '#shared/document/seenFigures.ts'
import { toRevisionLetters } from '#shared/revisionLetters.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Context } from '../context.ts'
import { inTransaction, type Reader, type Transaction } from '../db/client.ts'
import type { SheetRow } from '../db/schema/sheets.ts'
import { InvalidError, NotFoundError, RequestError } from '../errors.ts'
import { touchJob } from '../repositories/jobs.ts'
import { appendSheetEvent, listSheetEvents } from '../repositories/sheetEvents.ts'
import { findLatestOfNumber, findSheet, insertSheet, toSheetSummary } from '../repositories/sheets.ts'
import { requireDesigner, seeJob } from './access.ts'
import { isRetry, type Created } from './creation.ts'
import { toFingerprint } from './fingerprint.ts'
import { readSection } from './sections.ts'
import { compareSeen } from './seenComparison.ts'

export interface AskedSheet {
  id: string
  number: string
  document: AnalysisDocument
  seen: Seen
}

/** The sheet and the job as this person may see it. `what` names the thing asked for: the sheet or a part of it. */
export function seeSheet(
  reader: Reader,
  person: SignedIn,
  sheetId: string,
  what = 'sheet',
): { row: SheetRow; job: Job } {
  const row = findSheet(reader, sheetId)
  if (row === undefined) throw new NotFoundError(what)
  return { row, job: seeJob(reader, person, row.jobId, what) }
}

export function readSheet(reader: Reader, person: SignedIn, sheetId: string): StoredSheet {
  const { row, job } = seeSheet(reader, person, sheetId)
  return {
    ...toSheetContent(reader, row),
    job: { id: row.jobId, title: row.jobTitle, number: row.jobNumber, role: job.role },
    events: listSheetEvents(reader, sheetId),
  }
}

/** What a sheet says, to members and to visitors alike. */
export function toSheetContent(reader: Reader, row: SheetRow): Omit<StoredSheet, 'job' | 'events'> {
  const latest = findLatestOfNumber(reader, row.sectionId, row.number)
  return {
    ...toSheetSummary(row),
    sectionTitle: row.sectionTitle,
    supersededBy: latest === undefined || latest.id === row.id ? null : latest.id,
    document: row.document,
    result: row.result,
  }
}

/**
 * Saves a calculation sheet. The result is computed here, from the document, by the same solver; what the
 * browser saw is compared with it and then dropped, so no result from outside is ever stored.
 */
export async function saveSheet(
  { database, now, verifier }: Pick<Context, 'database' | 'now' | 'verifier'>,
  person: SignedIn,
  sectionId: string,
  asked: AskedSheet,
): Promise<Created<StoredSheet>> {
  requireDesigner(readSection(database, person, sectionId).job, 'save a calculation sheet')
  const { id, number, document } = asked
  const createdFrom = toFingerprint({ sectionId, number, document })
  const earlier = findEarlierTry(database, person, id, createdFrom)
  if (earlier !== null) return { item: earlier, fresh: false }

  const result = await computeOwnResult(verifier, document, asked.seen)

  return inTransaction(database, (tx) => {
    // All of it may have changed while the solver ran: role, title, and another try of this very request.
    const section = readSection(tx, person, sectionId)
    requireDesigner(section.job, 'save a calculation sheet')
    const meanwhile = findEarlierTry(tx, person, id, createdFrom)
    if (meanwhile !== null) return { item: meanwhile, fresh: false }
    const at = now()
    const revisionIndex = (findLatestOfNumber(tx, sectionId, number)?.revisionIndex ?? 0) + 1
    insertSheet(tx, {
      id,
      sectionId,
      jobId: section.jobId,
      sectionTitle: section.title,
      jobTitle: section.job.title,
      jobNumber: section.job.number,
      number,
      revisionIndex,
      document: result.document,
      result,
      digest: result.digest,
      solverVersion: result.solver.version,
      savedBy: person.id,
      savedByName: person.name,
      savedByInitials: person.initials,
      createdFrom,
      savedAt: at,
    })
    recordSheetEvent(tx, id, person, at, {
      kind: 'saved',
      text: `Sheet ${number}, revision ${toRevisionLetters(revisionIndex)}, saved`,
    })
    touchJob(tx, section.jobId, at)
    return { item: readSheet(tx, person, id), fresh: true }
  })
}

export function recordSheetEvent(
  tx: Transaction,
  sheetId: string,
  person: SignedIn,
  at: number,
  event: Pick<StoredSheet['events'][number], 'kind' | 'text'>,
): void {
  appendSheetEvent(tx, { sheetId, byId: person.id, byName: person.name, at, ...event })
}

function findEarlierTry(
  reader: Reader,
  person: SignedIn,
  id: string,
  createdFrom: string,
): StoredSheet | null {
  const row = findSheet(reader, id)
  const origin = row && { createdBy: row.savedBy, createdFrom: row.createdFrom }
  return isRetry(origin, { createdBy: person.id, createdFrom }, 'sheet')
    ? readSheet(reader, person, id)
    : null
}

async function computeOwnResult(
  verifier: Context['verifier'],
  document: AnalysisDocument,
  seen: Seen,
): Promise<MomentCurvatureResult> {
  const reply = await verifier.analyse(document)
  if (reply.status === 'bad-document') throw new InvalidError('The document is not sound.', reply.issues)
  const issues = compareSeen(seen, toSeen(reply.result))
  if (issues.length > 0) {
    throw new RequestError(
      422,
      'verification-failed',
      'The sheet was not saved: the server computes something else from this document than this page shows. Reload the page, so that both use the same solver, and save again.',
      { issues },
    )
  }
  return reply.result
}
