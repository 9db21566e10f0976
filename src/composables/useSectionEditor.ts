/**
 * The section in hand: title and document with undo, their issues, and whether they differ from what is stored.
 * Every change is kept in this browser until it is saved, so that nothing is lost.
 */
import { useDebounceFn, useEventListener } from '@vueuse/core'
import { computed, shallowRef, watch, type ComputedRef, type ShallowRef } from 'vue'
import type { StoredSection } from '#shared/api.ts'
import type { AnalysisDocument, Issue, Section } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { Draft, DraftStorage } from '@/clients/draftStorage.ts'
import { useHistory } from '@/composables/useHistory.ts'

interface Work {
  title: string
  document: AnalysisDocument
}

export interface SectionEditor {
  title: ComputedRef<string>
  document: ComputedRef<AnalysisDocument>
  /** The document with all defaults, or null while it has issues. */
  sound: ComputedRef<AnalysisDocument | null>
  issues: ComputedRef<Issue[]>
  /** Differs from what is stored. */
  dirty: ComputedRef<boolean>
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
  undo(): void
  redo(): void
  /** `now` makes an undo step; `later` belongs to a drag that goes on. */
  edit(document: AnalysisDocument, commit?: 'now' | 'later'): void
  editSection(section: Section, commit?: 'now' | 'later'): void
  rename(title: string): void
  /** Revision that the work started from: a write that names an older one than the stored is a conflict. */
  baseRevision: Readonly<ShallowRef<number>>
  /** Unsaved work of an earlier visit that was taken up again, until it is saved or dropped. */
  restored: Readonly<ShallowRef<Draft | null>>
  /** Drops unsaved work and starts from the stored section. */
  startFrom(stored: StoredSection): void
  /** Tells the editor that its present state was stored. */
  wasSaved(stored: StoredSection): void
  /** False when the browser refused to keep unsaved work. */
  draftKept: Readonly<ShallowRef<boolean>>
}

export interface SectionEditorOptions {
  stored: StoredSection
  drafts: DraftStorage
  /** Nothing is kept for people who may only read. */
  editable: boolean
  now?: () => number
}

export function useSectionEditor({
  stored,
  drafts,
  editable,
  now = Date.now,
}: SectionEditorOptions): SectionEditor {
  const base = shallowRef(stored)
  const draft = editable ? drafts.find(stored.id) : undefined
  const restored = shallowRef<Draft | null>(draft ?? null)
  const baseRevision = shallowRef(draft?.baseRevision ?? stored.revision)
  const draftKept = shallowRef(true)
  const history = useHistory<Work>({ title: stored.title, document: stored.document })
  if (draft) history.apply({ title: draft.title, document: draft.document }, 'now')

  const read = computed(() => readDocument(history.current.value.document))
  const written = computed(() => write(base.value.document))
  const dirty = computed(() => {
    const { title, document } = history.current.value
    return (
      title !== base.value.title || (document !== base.value.document && write(document) !== written.value)
    )
  })

  function keepDraft() {
    if (!editable) return
    if (!dirty.value) {
      drafts.remove(base.value.id)
      return
    }
    const { title, document } = history.current.value
    draftKept.value = drafts.keep(base.value.id, {
      title,
      document,
      baseRevision: baseRevision.value,
      changedAt: now(),
    })
  }
  watch(history.current, useDebounceFn(keepDraft, 250, { maxWait: 1000 }))
  useEventListener(globalThis.window, 'pagehide', keepDraft)

  function edit(document: AnalysisDocument, commit: 'now' | 'later' = 'now') {
    history.apply({ ...history.current.value, document }, commit)
  }

  return {
    title: computed(() => history.current.value.title),
    document: computed(() => history.current.value.document),
    sound: computed(() => (read.value.status === 'read' ? read.value.document : null)),
    issues: computed(() => (read.value.status === 'bad' ? read.value.issues : [])),
    dirty,
    canUndo: history.canUndo,
    canRedo: history.canRedo,
    undo: history.undo,
    redo: history.redo,
    edit,
    editSection: (section, commit = 'now') => edit({ ...history.current.value.document, section }, commit),
    rename: (title) => history.apply({ ...history.current.value, title }, 'now'),
    baseRevision,
    restored,
    draftKept,
    startFrom(next) {
      base.value = next
      baseRevision.value = next.revision
      restored.value = null
      history.reset({ title: next.title, document: next.document })
      drafts.remove(next.id)
    },
    wasSaved(next) {
      base.value = next
      baseRevision.value = next.revision
      restored.value = null
      keepDraft()
    },
  }
}

/** Equal for documents that differ in the order of fields only. */
function write(document: AnalysisDocument): string {
  return JSON.stringify(sortKeys(document))
}

function sortKeys(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sortKeys)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, part]) => [key, sortKeys(part)]),
  )
}
