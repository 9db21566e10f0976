import { watch, type Ref } from 'vue'
import type { ApiError } from '@/clients/apiClient.ts'
import { useSessionStore } from '@/stores/session.ts'

/** Asks again, once signed in again in place, for what failed because nobody was signed in. */
export function useAfterSignInAgain(failure: Readonly<Ref<ApiError | null>>, again: () => unknown): void {
  const session = useSessionStore()
  watch(
    () => session.interrupted,
    (interrupted) => {
      if (!interrupted && session.user && failure.value?.code === 'not-signed-in') again()
    },
  )
}
