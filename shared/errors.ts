/** Codes that travel in `{ error: { code, message, issues?, requestId } }`; the page decides by code, never by message. */
export const errorCodes = [
  'invalid', // 400, with issues by path
  'not-signed-in', // 401
  'wrong-credentials', // 401
  'forbidden', // 403
  'foreign-origin', // 403
  'not-found', // 404
  'link-ended', // 410: expired or revoked
  'conflict', // 409: someone else saved meanwhile, with the stored state
  'id-taken', // 409: the client's id belongs to something else
  'too-large', // 413
  'too-many-tries', // 429
  'verification-failed', // 422: the server's own result differs from what the browser saw
  'solver-timeout', // 503
  'internal', // 500, cause logged and withheld
] as const

export type ErrorCode = (typeof errorCodes)[number]
