import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { NewLink, SheetLink, StoredSheet } from '#shared/api.ts'
import { ApiError, apiClient } from '@/clients/apiClient.ts'

/** A calculation sheet with its links. */
export const useSheetStore = defineStore('sheet', () => {
  const sheet = shallowRef<StoredSheet | null>(null)
  const links = shallowRef<SheetLink[]>([])
  const loading = ref<'idle' | 'loading' | 'ready' | 'failed'>('idle')
  const failure = shallowRef<ApiError | null>(null)
  let wanted = ''

  async function load(sheetId: string) {
    wanted = sheetId
    loading.value = 'loading'
    failure.value = null
    try {
      const one = await apiClient.getSheet(sheetId)
      // A viewer sees the sheet and not its links.
      const itsLinks = one.job.role === 'viewer' ? [] : await apiClient.listLinks(sheetId)
      if (wanted !== sheetId) return
      sheet.value = one
      links.value = itsLinks
      loading.value = 'ready'
    } catch (error) {
      if (wanted !== sheetId) return
      failure.value = ApiError.from(error)
      loading.value = 'failed'
    }
  }

  /** The token of the new link, to be shown once. */
  async function makeLink(body: NewLink): Promise<string> {
    const { token, ...link } = await apiClient.postLink(wanted, body)
    links.value = [link, ...links.value.filter((one) => one.id !== link.id)]
    return token
  }

  async function revokeLink(linkId: string) {
    const revoked = await apiClient.revokeLink(linkId)
    links.value = links.value.map((one) => (one.id === linkId ? revoked : one))
  }

  return { sheet, links, loading, failure, load, makeLink, revokeLink }
})
