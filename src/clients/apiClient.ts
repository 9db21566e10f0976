/**
 * The only door to the server. Every call answers with the typed payload or throws an `ApiError` whose code the page
 * decides by. Reading is tried once more when the server could not be reached; writing is not, the person decides.
 */
import type { ZodType } from 'zod'
import {
  paths,
  type AccountPatch,
  type CreatedLink,
  type ErrorBody,
  type Job,
  type JobPatch,
  type JobRole,
  type LinkedSheet,
  type LinkEnd,
  type Member,
  type NewJob,
  type NewLink,
  type NewSection,
  type NewSheet,
  type NewUser,
  type Page,
  type PasswordChange,
  type SectionSummary,
  type SectionWrite,
  type SheetLink,
  type SheetSummary,
  type SignIn,
  type StoredSection,
  type StoredSheet,
  type User,
  type UserPatch,
} from '#shared/api.ts'
import type { Issue } from '#shared/document/analysisDocument.ts'
import type { ErrorCode } from '#shared/errors.ts'

/** Codes of the server, and those of the way to it. */
export type ApiErrorCode = ErrorCode | 'unreachable' | 'unreadable'

interface ApiErrorDetails {
  status?: number
  issues?: Issue[]
  requestId?: string
  stored?: unknown
  ended?: LinkEnd
  cause?: unknown
}

export class ApiError extends Error {
  override name = 'ApiError'
  readonly code: ApiErrorCode
  readonly status: number | undefined
  readonly issues: Issue[]
  readonly requestId: string | undefined
  readonly stored: unknown
  readonly ended: LinkEnd | undefined

  constructor(code: ApiErrorCode, message: string, details: ApiErrorDetails = {}) {
    super(message, { cause: details.cause })
    this.code = code
    this.status = details.status
    this.issues = details.issues ?? []
    this.requestId = details.requestId
    this.stored = details.stored
    this.ended = details.ended
  }

  /** Whatever was thrown, as an ApiError; a fault of our own keeps its cause. */
  static from(thrown: unknown): ApiError {
    if (thrown instanceof ApiError) return thrown
    const message = thrown instanceof Error ? thrown.message : String(thrown)
    return new ApiError('unreadable', `Something in the page failed: ${message}`, { cause: thrown })
  }

  /** The sentence for one field of a form. */
  issueAt(path: string): string | undefined {
    const issue = this.issues.find((one) => one.path === path)
    return issue && [issue.message, issue.allowed && `allowed ${issue.allowed}`].filter(Boolean).join(', ')
  }
}

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

interface CallOptions {
  body?: unknown
  /** Revision that a write is based on. */
  revision?: number
}

/** A write waits longer: the server computes a sheet before it answers. */
const patience: Record<Method, number> = {
  GET: 15_000,
  POST: 45_000,
  PUT: 20_000,
  PATCH: 20_000,
  DELETE: 20_000,
}
const retryAfter = 700

let onSignedOut: (() => void) | null = null

/** Told whenever a call finds that nobody is signed in any more. */
export function whenSignedOut(listener: () => void): void {
  onSignedOut = listener
}

async function call<T>(method: Method, path: string, options: CallOptions = {}): Promise<T> {
  const response = await reach(method, path, options)
  if (response.status === 204) return undefined as T
  const body: unknown = await response.json().catch((cause: unknown) => {
    // The answer began and broke off, or it is not ours: a gateway's own page, say.
    throw cause instanceof SyntaxError ? unreadable(response.status, cause) : unreachable(method, cause)
  })
  if (response.ok) return body as T
  if (!isErrorBody(body)) throw unreadable(response.status, body)
  const { code, message, ...details } = body.error
  if (code === 'not-signed-in' && path !== paths.session) onSignedOut?.()
  throw new ApiError(code, message, { status: response.status, ...details })
}

function isErrorBody(body: unknown): body is ErrorBody {
  if (typeof body !== 'object' || body === null || !('error' in body)) return false
  const { error } = body
  return typeof error === 'object' && error !== null && 'code' in error && 'message' in error
}

async function reach(method: Method, path: string, { body, revision }: CallOptions): Promise<Response> {
  const headers: Record<string, string> = { accept: 'application/json' }
  if (body !== undefined) headers['content-type'] = 'application/json'
  if (revision !== undefined) headers['if-match'] = `"${revision}"`
  const attempt = () =>
    fetch(path, {
      method,
      headers,
      body: body === undefined ? undefined : JSON.stringify(body),
      credentials: 'same-origin',
      signal: AbortSignal.timeout(patience[method]),
    })
  try {
    return await attempt()
  } catch (cause) {
    // Who has waited long enough is told, not made to wait again.
    if (method !== 'GET' || isLate(cause)) throw unreachable(method, cause)
  }
  await new Promise((resolve) => setTimeout(resolve, retryAfter))
  try {
    return await attempt()
  } catch (cause) {
    throw unreachable(method, cause)
  }
}

const isLate = (cause: unknown) => cause instanceof DOMException && cause.name === 'TimeoutError'

function unreachable(method: Method, cause: unknown): ApiError {
  const what = isLate(cause) ? 'The server took too long to answer.' : 'The server cannot be reached.'
  const way =
    method === 'GET'
      ? 'Try again when the connection is back.'
      : 'What you typed is kept; try again when the connection is back.'
  return new ApiError('unreachable', `${what} ${way}`, { cause })
}

function unreadable(status: number, cause: unknown): ApiError {
  const message = `What answered is not the server of Girdwell, or it failed (status ${status}). Try again.`
  return new ApiError('unreadable', message, { status, cause })
}

/** All items of a list, page after page. */
async function listAll<T>(path: string): Promise<T[]> {
  const items: T[] = []
  let cursor: string | null = null
  do {
    const query: string = cursor === null ? 'limit=200' : `limit=200&cursor=${encodeURIComponent(cursor)}`
    const page: Page<T> = await call<Page<T>>('GET', `${path}?${query}`)
    items.push(...page.items)
    cursor = page.nextCursor
  } while (cursor !== null)
  return items
}

/** Issues of a payload before it is sent, in the form in which the server would tell them. */
export function findFormIssues(schema: ZodType, payload: unknown): Issue[] {
  const parsed = schema.safeParse(payload)
  if (parsed.success) return []
  return parsed.error.issues.map(({ path, message }) => ({
    path: path.map(String).join('.'),
    code: 'invalid',
    message,
  }))
}

export const apiClient = {
  getSession: () => call<User>('GET', paths.session),
  signIn: (body: SignIn) => call<User>('POST', paths.signIn, { body }),
  signOut: () => call<void>('POST', paths.signOut, { body: {} }),
  patchAccount: (body: AccountPatch) => call<User>('PATCH', paths.account, { body }),
  changePassword: (body: PasswordChange) => call<void>('POST', paths.password, { body }),

  listUsers: () => listAll<User>(paths.users),
  postUser: (body: NewUser) => call<User>('POST', paths.users, { body }),
  patchUser: (userId: string, body: UserPatch) => call<User>('PATCH', paths.user(userId), { body }),

  listJobs: () => listAll<Job>(paths.jobs),
  postJob: (body: NewJob) => call<Job>('POST', paths.jobs, { body }),
  getJob: (jobId: string) => call<Job>('GET', paths.job(jobId)),
  patchJob: (jobId: string, revision: number, body: JobPatch) =>
    call<Job>('PATCH', paths.job(jobId), { body, revision }),
  listMembers: (jobId: string) => listAll<Member>(paths.members(jobId)),
  putMember: (jobId: string, userId: string, role: JobRole) =>
    call<Member>('PUT', paths.member(jobId, userId), { body: { role } }),
  deleteMember: (jobId: string, userId: string) => call<void>('DELETE', paths.member(jobId, userId)),

  listSections: (jobId: string) => listAll<SectionSummary>(paths.sections(jobId)),
  postSection: (jobId: string, body: NewSection) =>
    call<StoredSection>('POST', paths.sections(jobId), { body }),
  getSection: (sectionId: string) => call<StoredSection>('GET', paths.section(sectionId)),
  putSection: (sectionId: string, revision: number, body: SectionWrite) =>
    call<StoredSection>('PUT', paths.section(sectionId), { body, revision }),

  listSheets: (sectionId: string) => listAll<SheetSummary>(paths.sheets(sectionId)),
  postSheet: (sectionId: string, body: NewSheet) =>
    call<StoredSheet>('POST', paths.sheets(sectionId), { body }),
  getSheet: (sheetId: string) => call<StoredSheet>('GET', paths.sheet(sheetId)),
  listLinks: (sheetId: string) => listAll<SheetLink>(paths.links(sheetId)),
  postLink: (sheetId: string, body: NewLink) => call<CreatedLink>('POST', paths.links(sheetId), { body }),
  revokeLink: (linkId: string) => call<SheetLink>('POST', paths.revokeLink(linkId), { body: {} }),
  getLinked: (token: string) => call<LinkedSheet>('GET', paths.link(token)),
}
