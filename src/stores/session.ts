import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { SignIn, User } from '#shared/api.ts'
import { ApiError, apiClient, whenSignedOut } from '@/clients/apiClient.ts'

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const user = shallowRef<User | null>(null)
  /** Somebody was signed in and is not any more: sign in again in place, nothing on the page is lost. */
  const interrupted = ref(false)
  let asked: Promise<void> | null = null

  whenSignedOut(() => {
    if (user.value) interrupted.value = true
  })

  /** Asks the server once who is signed in. */
  function ensureKnown(): Promise<void> {
    asked ??= apiClient.getSession().then(
      (known) => {
        user.value = known
      },
      (error: unknown) => {
        // Not being signed in is an answer; not having reached the server is none, so ask again next time.
        if (!(error instanceof ApiError && error.code === 'not-signed-in')) asked = null
      },
    )
    return asked
  }

  async function signIn(credentials: SignIn): Promise<void> {
    user.value = await apiClient.signIn(credentials)
    interrupted.value = false
    asked = Promise.resolve()
  }

  async function signOut(): Promise<void> {
    await apiClient.signOut()
    user.value = null
    interrupted.value = false
  }

  function wasChanged(changed: User) {
    user.value = changed
  }

  return { user, interrupted, ensureKnown, signIn, signOut, wasChanged }
})
