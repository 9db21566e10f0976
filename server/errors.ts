import type { ErrorRequestHandler, RequestHandler } from 'express'
import type { z } from 'zod'
import type { ErrorBody, LinkEnd } from '#shared/api.ts'
import type { Issue } from '#shared/document/analysisDocument.ts'
import type { ErrorCode } from '#shared/errors.ts'

/** An outcome of a request that the page is told of, by code. */
export class RequestError extends Error {
  override name = 'RequestError'
  readonly status: number
  readonly code: ErrorCode
  /** Joins `code` and `message` in the answer. */
  readonly details: Partial<Pick<ErrorBody['error'], 'issues' | 'stored' | 'ended'>>

  constructor(status: number, code: ErrorCode, message: string, details: RequestError['details'] = {}) {
    super(message)
    this.status = status
    this.code = code
    this.details = details
  }
}

export class InvalidError extends RequestError {
  override name = 'InvalidError'
  constructor(message: string, issues: Issue[]) {
    super(400, 'invalid', message, { issues })
  }
}

export class NotSignedInError extends RequestError {
  override name = 'NotSignedInError'
  constructor() {
    super(401, 'not-signed-in', 'You are not signed in. Sign in and try again; what you typed is still here.')
  }
}

export class ForbiddenError extends RequestError {
  override name = 'ForbiddenError'
  constructor(message: string) {
    super(403, 'forbidden', message)
  }
}

/** Also for what the person may not see: its existence is not told. */
export class NotFoundError extends RequestError {
  override name = 'NotFoundError'
  constructor(what: string) {
    super(404, 'not-found', `There is no such ${what}, or it is not open to you.`)
  }
}

export class ConflictError extends RequestError {
  override name = 'ConflictError'
  constructor(what: string, read: number, storedRevision: number, stored: unknown) {
    super(
      409,
      'conflict',
      `Someone else saved this ${what} meanwhile: you began from revision ${read}, revision ${storedRevision} is stored. Nothing was overwritten.`,
      { stored },
    )
  }
}

export class IdTakenError extends RequestError {
  override name = 'IdTakenError'
  constructor(what: string) {
    super(
      409,
      'id-taken',
      `The id sent for this ${what} belongs to something else. Send it again with a new one.`,
    )
  }
}

export class LinkEndedError extends RequestError {
  override name = 'LinkEndedError'
  constructor(ended: LinkEnd, message: string) {
    super(410, 'link-ended', message, { ended })
  }
}

/** Payload issues of zod in the form of document issues: `members[0].role`. */
export function toIssues(error: z.ZodError): Issue[] {
  return error.issues.map((issue) => ({
    path: toPath(issue.path, issue.code === 'unrecognized_keys' ? issue.keys[0] : undefined),
    code: issue.code.replaceAll('_', '-'),
    message: issue.message,
  }))
}

function toPath(path: PropertyKey[], extra: string | undefined): string {
  const steps = extra === undefined ? path : [...path, extra]
  const text = steps
    .map((step, place) => (typeof step === 'number' ? `[${step}]` : (place > 0 ? '.' : '') + String(step)))
    .join('')
  return text === '' ? '(body)' : text
}

export const apiNotFound: RequestHandler = () => {
  throw new NotFoundError('address')
}

/** The last handler: every fault becomes one shape; what we did not foresee is logged and withheld. */
export const errorHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) return next(error)
  const known = toRequestError(error)
  if (known.status >= 500) request.log.error({ err: error }, 'request failed')
  const body: ErrorBody = {
    error: { code: known.code, message: known.message, ...known.details, requestId: String(request.id) },
  }
  response.status(known.status).json(body)
}

/** Faults of the body parser and the file server carry a status and a type of their own. */
interface HttpFault {
  status: number
  type?: string
}

function isHttpFault(error: unknown): error is HttpFault & Error {
  return error instanceof Error && 'status' in error && typeof error.status === 'number'
}

function toRequestError(error: unknown): RequestError {
  if (error instanceof RequestError) return error
  if (isHttpFault(error)) {
    if (error.type === 'entity.too.large') {
      return new RequestError(413, 'too-large', 'The request is larger than the 2 MB that are allowed.')
    }
    if (error.type === 'entity.parse.failed') {
      return new InvalidError('The request is not sound JSON.', [
        { path: '(body)', code: 'json', message: error.message },
      ])
    }
    if (error.status === 404) return new NotFoundError('file')
    if (error.status >= 400 && error.status < 500) {
      return new InvalidError('The request cannot be read.', [
        { path: '(body)', code: 'unreadable', message: error.message },
      ])
    }
  }
  return new RequestError(
    500,
    'internal',
    'The server failed at this. Try again; if it happens again, tell your administrator the request number.',
  )
}
