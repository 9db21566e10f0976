/** A form that is sent: checked first, busy meanwhile, and told at its fields what is wrong. Nothing typed is lost. */
import { ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import type { ZodType } from 'zod'
import { ApiError, findFormIssues } from '@/clients/apiClient.ts'

export interface Submit<Body> {
  busy: Readonly<Ref<boolean>>
  /** Why it was not taken, with issues by field. */
  failure: ShallowRef<ApiError | null>
  submit(body: Body): Promise<void>
}

export interface SubmitOptions<Body, Reply> {
  /** What the server will check; bodies that fail are not sent. */
  schema?: ZodType
  send(body: Body): Promise<Reply>
  done(reply: Reply): void
}

export function useSubmit<Body, Reply>({ schema, send, done }: SubmitOptions<Body, Reply>): Submit<Body> {
  const busy = ref(false)
  const failure = shallowRef<ApiError | null>(null)

  async function submit(body: Body) {
    // Enter pressed twice is one wish.
    if (busy.value) return
    const issues = schema ? findFormIssues(schema, body) : []
    failure.value = issues.length > 0 ? new ApiError('invalid', '', { issues }) : null
    if (failure.value) return
    busy.value = true
    try {
      done(await send(body))
    } catch (error) {
      failure.value = ApiError.from(error)
    } finally {
      busy.value = false
    }
  }

  return { busy, failure, submit }
}
