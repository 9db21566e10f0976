/**
 * Paths and payloads of the API, used by both ends. Times are UTC milliseconds. Ids of created things are
 * UUIDs made by the client, so that a retry is safe. Whatever two people can edit carries a `revision`;
 * a write names the one it read in `If-Match`.
 */
import './noCodeFromText.ts'
import { z } from 'zod'
import type { AnalysisDocument, Issue } from './document/analysisDocument.ts'
import type { MomentCurvatureResult } from './document/analysisResult.ts'
import type { ErrorCode } from './errors.ts'

export const paths = {
  /** GET: Health, public. */
  health: '/api/health',
  /** POST SignIn: User, and the cookie. */
  signIn: '/api/sign-in',
  /** POST: 204. */
  signOut: '/api/sign-out',
  /** GET: who is signed in, 401 when nobody is. */
  session: '/api/session',
  /** POST PasswordChange: 204; every other session of this person ends. */
  password: '/api/account/password',
  /** PATCH AccountPatch: User. */
  account: '/api/account',
  /** GET: Page<User>; POST NewUser: User. Administrators. */
  users: '/api/users',
  /** PATCH UserPatch: User. Administrators. */
  user: (userId: string) => `/api/users/${userId}`,
  /** GET: Page<Job>, those that the person may see; POST NewJob: Job. */
  jobs: '/api/jobs',
  /** GET: Job; PATCH JobPatch with If-Match: Job. */
  job: (jobId: string) => `/api/jobs/${jobId}`,
  /** GET: Page<Member>. */
  members: (jobId: string) => `/api/jobs/${jobId}/members`,
  /** PUT MemberRole: Member; DELETE: 204. Administrators. */
  member: (jobId: string, userId: string) => `/api/jobs/${jobId}/members/${userId}`,
  /** GET: Page<SectionSummary>; POST NewSection: StoredSection. */
  sections: (jobId: string) => `/api/jobs/${jobId}/sections`,
  /** GET: StoredSection; PUT SectionWrite with If-Match: StoredSection. */
  section: (sectionId: string) => `/api/sections/${sectionId}`,
  /** GET: Page<SheetSummary>, latest first; POST NewSheet: StoredSheet. */
  sheets: (sectionId: string) => `/api/sections/${sectionId}/sheets`,
  /** GET: StoredSheet. */
  sheet: (sheetId: string) => `/api/sheets/${sheetId}`,
  /** GET: Page<SheetLink>, latest first; POST NewLink: CreatedLink. */
  links: (sheetId: string) => `/api/sheets/${sheetId}/links`,
  /** POST: SheetLink. */
  revokeLink: (linkId: string) => `/api/links/${linkId}/revoke`,
  /** GET: LinkedSheet. Public: the token is the key. */
  link: (token: string) => `/api/link/${token}`,
} as const

export const jobRoles = ['designer', 'checker', 'viewer'] as const
export type JobRole = (typeof jobRoles)[number]
export const officeRoles = ['administrator', 'member'] as const
export type OfficeRole = (typeof officeRoles)[number]

const id = z.uuid()
const title = z.string().trim().min(1, 'Give it a name').max(120)
const personName = z.string().trim().min(1).max(80)
const initials = z.string().trim().min(1).max(4)
/** Trimmed before it is judged: a pasted address brings blanks along. */
const email = z.string().trim().toLowerCase().max(200).pipe(z.email())
/** NIST SP 800-63B 5.1.1.2: length is what counts; no composition rules. */
const password = z.string().min(10).max(200)

export const signInSchema = z.strictObject({ email, password: z.string().min(1).max(200) })
export const passwordSchema = z.strictObject({ current: z.string().min(1).max(200), next: password })
export const accountPatchSchema = z.strictObject({ name: personName, initials })
export const newUserSchema = z.strictObject({
  id,
  name: personName,
  initials,
  email,
  password,
  role: z.enum(officeRoles),
})
export const userPatchSchema = z.strictObject({
  role: z.enum(officeRoles).optional(),
  active: z.boolean().optional(),
  password: password.optional(),
})
export const newJobSchema = z.strictObject({ id, title, number: z.string().trim().max(40) })
export const jobPatchSchema = z.strictObject({ title, number: z.string().trim().max(40) })
export const memberSchema = z.strictObject({ role: z.enum(jobRoles) })
/** `document` is read by the document reader, so that its issues carry their own paths. */
export const newSectionSchema = z.strictObject({ id, title, document: z.unknown() })
export const sectionWriteSchema = z.strictObject({ title, document: z.unknown() })
/** What the browser saw when the sheet was saved; the server computes its own and compares. */
export const seenSchema = z.strictObject({
  digest: z.string().max(100),
  ultimateCurvature: z.number().nullable(),
  ultimateMoment: z.number().nullable(),
  greatestMoment: z.number().nullable(),
})
export const newSheetSchema = z.strictObject({
  id,
  number: z.string().trim().min(1, 'Give the sheet a number').max(40),
  document: z.unknown(),
  seen: seenSchema,
})
export const newLinkSchema = z.strictObject({
  id,
  /** For whom, in words. */
  recipient: z.string().trim().min(1).max(120),
  /** UTC ms */
  expiresAt: z.int(),
})

/** Longest life of a link, ms: a link outlives neither the check nor the memory of it. */
export const longestLinkLife = 366 * 24 * 3600 * 1000
/** Of every list: `?cursor=&limit=`. */
export const pageLimit = { usual: 50, most: 200 } as const

export type SignIn = z.infer<typeof signInSchema>
export type PasswordChange = z.infer<typeof passwordSchema>
export type AccountPatch = z.infer<typeof accountPatchSchema>
export type JobPatch = z.infer<typeof jobPatchSchema>
export type MemberRole = z.infer<typeof memberSchema>
export type NewUser = z.infer<typeof newUserSchema>
export type UserPatch = z.infer<typeof userPatchSchema>
export type NewJob = z.infer<typeof newJobSchema>
export type Seen = z.infer<typeof seenSchema>
export interface NewSection {
  id: string
  title: string
  document: AnalysisDocument
}
export interface SectionWrite {
  title: string
  document: AnalysisDocument
}
export interface NewSheet {
  id: string
  number: string
  document: AnalysisDocument
  seen: Seen
}
export type NewLink = z.infer<typeof newLinkSchema>

export interface User {
  id: string
  name: string
  initials: string
  email: string
  role: OfficeRole
  active: boolean
}

export interface Job {
  id: string
  title: string
  number: string
  revision: number
  createdAt: number
  /** Role of the person who asks; null for an administrator who is not a member. */
  role: JobRole | null
  sectionCount: number
  /** Latest change of the job or any of its sections. */
  changedAt: number
}

export interface Member {
  userId: string
  name: string
  initials: string
  email: string
  role: JobRole
}

export interface SectionSummary {
  id: string
  jobId: string
  title: string
  revision: number
  changedAt: number
  changedBy: string
  sheetCount: number
}

export interface StoredSection extends SectionSummary {
  document: AnalysisDocument
  job: Job
}

export interface SheetEvent {
  kind: 'saved' | 'link-made' | 'link-revoked'
  at: number
  /** Name of the person. */
  by: string
  text: string
}

export interface SheetSummary {
  id: string
  sectionId: string
  number: string
  /** A, B, C ... in order of saving for one number. */
  revision: string
  digest: string
  solverVersion: string
  savedAt: number
  savedBy: { name: string; initials: string }
}

export interface StoredSheet extends SheetSummary {
  sectionTitle: string
  job: { id: string; title: string; number: string; role: JobRole | null }
  /** Later sheet of the same number, if any. */
  supersededBy: string | null
  document: AnalysisDocument
  result: MomentCurvatureResult
  events: SheetEvent[]
}

export interface SheetLink {
  id: string
  sheetId: string
  recipient: string
  createdAt: number
  createdBy: string
  expiresAt: number
  revokedAt: number | null
}

/** The token is shown once, here; the store keeps its hash only. */
export interface CreatedLink extends SheetLink {
  token: string
}

/** What a visitor with a link sees: a sheet without the office behind it. */
export interface LinkedSheet {
  sheet: Omit<StoredSheet, 'events' | 'job'> & { job: { title: string; number: string } }
  recipient: string
  expiresAt: number
}

export interface Page<T> {
  items: T[]
  nextCursor: string | null
}

export type LinkEnd = 'expired' | 'revoked'

export interface ErrorBody {
  error: {
    code: ErrorCode
    message: string
    issues?: Issue[]
    requestId: string
    /** With `conflict`: the stored state. */
    stored?: unknown
    /** With `link-ended`: how it ended. */
    ended?: LinkEnd
  }
}

export interface Health {
  status: 'ok'
  version: string
  database: 'ok'
}
