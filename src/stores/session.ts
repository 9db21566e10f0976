import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { SignIn, User } from '#shared/api.ts'
import { ApiError, apiClient, whenSignedOut } from '@/clients/apiClient.ts'

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const user = shallowRef<User | null>(null)
  /** Somebody was signed in and is not any more: sign in again in place, nothing on the page is lost. */
  const interrupted = ref(false)
  /** Why it is not known who is signed in: the server was not reached. */
  const unreached = shallowRef<ApiError | null>(null)
  let asked: Promise<void> | null = null

  whenSignedOut(() => {
    if (user.value) interrupted.value = true
  })

  /** Asks the server once who is signed in. */
  function ensureKnown(): Promise<void> {
    asked ??= apiClient.getSession().then(
      (known) => {
        user.value = known
        unreached.value = null
      },
      (thrown: unknown) => {
        // Not being signed in is an answer; not having reached the server is none, so ask again next time.
        const error = ApiError.from(thrown)
        const answered = error.code === 'not-signed-in'
        unreached.value = answered ? null : error
        if (!answered) asked = null
      },
    )
    return asked
  }

  async function signIn(credentials: SignIn): Promise<void> {
    user.value = await apiClient.signIn(credentials)
    interrupted.value = false
    unreached.value = null
    asked = Promise.resolve()
  }

  async function signOut(): Promise<void> {
    await apiClient.signOut()
    leave()
  }

  /** Nobody any more, on this page. */
  function leave() {
    user.value = null
    interrupted.value = false
  }

  function wasChanged(changed: User) {
    user.value = changed
  }

  return { user, interrupted, unreached, ensureKnown, signIn, signOut, leave, wasChanged }
})
