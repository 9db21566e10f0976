import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { Job, Member, SectionSummary } from '#shared/api.ts'
import { ApiError, apiClient } from '@/clients/apiClient.ts'

/** One job with its sections and members. */
export const useJobStore = defineStore('job', () => {
  const job = shallowRef<Job | null>(null)
  const sections = shallowRef<SectionSummary[]>([])
  const members = shallowRef<Member[]>([])
  const loading = ref<'idle' | 'loading' | 'ready' | 'failed'>('idle')
  const failure = shallowRef<ApiError | null>(null)
  let wanted = ''

  /** The same job again stays in sight meanwhile; another one is never shown in its place. */
  async function load(jobId: string) {
    const again = job.value?.id === jobId
    wanted = jobId
    if (!again) job.value = null
    if (!again || loading.value === 'failed') loading.value = 'loading'
    failure.value = null
    try {
      const [one, itsSections, itsMembers] = await Promise.all([
        apiClient.getJob(jobId),
        apiClient.listSections(jobId),
        apiClient.listMembers(jobId),
      ])
      if (wanted !== jobId) return
      job.value = one
      sections.value = itsSections
      members.value = itsMembers
      loading.value = 'ready'
    } catch (error) {
      if (wanted !== jobId) return
      failure.value = ApiError.from(error)
      loading.value = 'failed'
    }
  }

  /** Nothing of it stays for whoever signs in next on this machine. */
  function clear() {
    wanted = ''
    job.value = null
    sections.value = []
    members.value = []
    loading.value = 'idle'
  }

  return { job, sections, members, loading, failure, load, clear }
})
