/**
 * Unsaved work, kept in this browser so that a reload, a crash or an ended sign-in loses nothing.
 * Storage may be full or switched off: then the page goes on and says so.
 */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'

export interface Draft {
  title: string
  document: AnalysisDocument
  /** Revision of the stored section the draft started from. */
  baseRevision: number
  /** UTC ms */
  changedAt: number
}

export interface DraftStorage {
  find(sectionId: string): Draft | undefined
  /** False when the browser refused to keep it. */
  keep(sectionId: string, draft: Draft): boolean
  remove(sectionId: string): void
}

export function createDraftStorage(
  storage: Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>,
): DraftStorage {
  const key = (sectionId: string) => `girdwell:draft:${sectionId}`
  return {
    find(sectionId) {
      const text = storage.getItem(key(sectionId))
      if (text === null) return undefined
      try {
        const draft: unknown = JSON.parse(text)
        return isDraft(draft) ? draft : undefined
      } catch {
        // Not ours, or cut off while it was written: there is nothing to restore from it.
        return undefined
      }
    },
    keep(sectionId, draft) {
      try {
        storage.setItem(key(sectionId), JSON.stringify(draft))
        return true
      } catch {
        return false
      }
    },
    remove: (sectionId) => storage.removeItem(key(sectionId)),
  }
}

function isDraft(value: unknown): value is Draft {
  if (typeof value !== 'object' || value === null) return false
  const draft = value as Partial<Draft>
  return (
    typeof draft.title === 'string' &&
    typeof draft.baseRevision === 'number' &&
    typeof draft.changedAt === 'number' &&
    typeof draft.document === 'object' &&
    draft.document !== null &&
    'section' in draft.document &&
    'materials' in draft.document &&
    'analysis' in draft.document
  )
}
