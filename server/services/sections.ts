import type { StoredSection } from '#shared/api.ts'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Context } from '../context.ts'
import { inTransaction, type Reader } from '../db/client.ts'
import { ConflictError, NotFoundError } from '../errors.ts'
import { touchJob } from '../repositories/jobs.ts'
import { findSection, findSectionOrigin, insertSection, updateSection } from '../repositories/sections.ts'
import { requireDesigner, seeJob } from './access.ts'
import { isRetry, type Created } from './creation.ts'
import { toFingerprint } from './fingerprint.ts'

type Uses = Pick<Context, 'database' | 'now'>

interface Content {
  title: string
  document: AnalysisDocument
}

export function readSection(reader: Reader, person: SignedIn, sectionId: string): StoredSection {
  const section = findSection(reader, sectionId)
  if (section === undefined) throw new NotFoundError('section')
  return { ...section, job: seeJob(reader, person, section.jobId, 'section') }
}

export function createSection(
  { database, now }: Uses,
  person: SignedIn,
  jobId: string,
  { id, title, document }: Content & { id: string },
): Created<StoredSection> {
  const origin = { createdBy: person.id, createdFrom: toFingerprint({ jobId, title, document }) }
  return inTransaction(database, (tx) => {
    requireDesigner(seeJob(tx, person, jobId), 'add a section')
    if (isRetry(findSectionOrigin(tx, id), origin, 'section')) {
      return { item: readSection(tx, person, id), fresh: false }
    }
    const at = now()
    insertSection(tx, {
      id,
      jobId,
      title,
      document,
      revision: 1,
      ...origin,
      createdAt: at,
      changedBy: person.id,
      changedAt: at,
    })
    touchJob(tx, jobId, at)
    return { item: readSection(tx, person, id), fresh: true }
  })
}

/**
 * Saves over the revision that the person read. Content that is already stored is no conflict and no new
 * revision, so a retry after a lost answer is safe here too.
 */
export function saveSection(
  { database, now }: Uses,
  person: SignedIn,
  sectionId: string,
  read: number,
  { title, document }: Content,
): StoredSection {
  return inTransaction(database, (tx) => {
    const stored = readSection(tx, person, sectionId)
    requireDesigner(stored.job, 'change its sections')
    const same =
      toFingerprint({ title, document }) === toFingerprint({ title: stored.title, document: stored.document })
    if (same) return stored
    if (stored.revision !== read) throw new ConflictError('section', read, stored.revision, stored)
    const at = now()
    updateSection(tx, sectionId, {
      title,
      document,
      revision: stored.revision + 1,
      changedBy: person.id,
      changedAt: at,
    })
    touchJob(tx, stored.jobId, at)
    return readSection(tx, person, sectionId)
  })
}
