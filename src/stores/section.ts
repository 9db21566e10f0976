import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { SectionWrite, StoredSection } from '#shared/api.ts'
import { ApiError, apiClient } from '@/clients/apiClient.ts'

/** The section on the page as the server keeps it, and how the last save went. */
export const useSectionStore = defineStore('section', () => {
  const stored = shallowRef<StoredSection | null>(null)
  const loading = ref<'idle' | 'loading' | 'ready' | 'failed'>('idle')
  const loadFailure = shallowRef<ApiError | null>(null)

  const saving = ref<'idle' | 'saving' | 'failed' | 'conflict'>('idle')
  const saveFailure = shallowRef<ApiError | null>(null)
  /** What somebody else saved meanwhile. */
  const theirs = shallowRef<StoredSection | null>(null)
  let wanted = ''

  async function load(sectionId: string) {
    wanted = sectionId
    loading.value = 'loading'
    loadFailure.value = null
    saving.value = 'idle'
    theirs.value = null
    try {
      const section = await apiClient.getSection(sectionId)
      if (wanted !== sectionId) return
      stored.value = section
      loading.value = 'ready'
    } catch (error) {
      if (wanted !== sectionId) return
      loadFailure.value = ApiError.from(error)
      loading.value = 'failed'
    }
  }

  /** Writes over the revision that the work started from. Tells the stored section, or null where it was not stored. */
  async function save(write: SectionWrite, baseRevision: number): Promise<StoredSection | null> {
    const base = stored.value
    if (!base || saving.value === 'saving') return null
    saving.value = 'saving'
    saveFailure.value = null
    try {
      const section = await apiClient.putSection(base.id, baseRevision, write)
      stored.value = section
      saving.value = 'idle'
      return section
    } catch (error) {
      const failure = ApiError.from(error)
      saveFailure.value = failure
      saving.value = 'failed'
      if (failure.code === 'conflict') {
        theirs.value = failure.stored as StoredSection
        saving.value = 'conflict'
      }
      return null
    }
  }

  /** Goes on from what somebody else saved. */
  function takeTheirs(): StoredSection | null {
    const section = theirs.value
    if (!section) return null
    stored.value = section
    theirs.value = null
    saving.value = 'idle'
    return section
  }

  /** Keeps one's own work as a new section of the same job. */
  async function keepAsCopy(id: string, write: SectionWrite): Promise<StoredSection | null> {
    const base = stored.value
    if (!base) return null
    try {
      const copy = await apiClient.postSection(base.jobId, { id, ...write })
      theirs.value = null
      saving.value = 'idle'
      return copy
    } catch (error) {
      saveFailure.value = ApiError.from(error)
      return null
    }
  }

  function postponeConflict() {
    if (saving.value === 'conflict') saving.value = 'failed'
  }

  return {
    stored,
    loading,
    loadFailure,
    saving,
    saveFailure,
    theirs,
    load,
    save,
    takeTheirs,
    keepAsCopy,
    postponeConflict,
  }
})
