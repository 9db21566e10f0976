import type { Request } from 'express'
import { z } from 'zod'
import { pageLimit } from '#shared/api.ts'
import { InvalidError, NotFoundError, toIssues } from '../errors.ts'
import type { PageRequest } from '../repositories/page.ts'

/** The body by its schema; throws its issues, each with the name of its field. */
export function parseBody<Schema extends z.ZodType>(schema: Schema, request: Request): z.output<Schema> {
  if (request.body === undefined) {
    throw new InvalidError('The request has no content.', [
      { path: '(body)', code: 'required', message: 'send JSON, with Content-Type: application/json' },
    ])
  }
  const read = schema.safeParse(request.body)
  if (!read.success) throw new InvalidError('Some entries need another look.', toIssues(read.error))
  return read.data
}

/** The id in the path; what is no id names nothing that exists. */
export function parseId(text: string | string[], what: string): string {
  const read = z.uuid().safeParse(text)
  if (!read.success) throw new NotFoundError(what)
  return read.data
}

/** The revision that the writer read, from If-Match: `"3"`. */
export function parseIfMatch(request: Request): number {
  const header = request.get('If-Match')
  const match = /^(?:W\/)?"?(\d{1,9})"?$/.exec(header?.trim() ?? '')
  if (match === null) {
    throw new InvalidError('The request does not say which revision it was made from.', [
      {
        path: 'If-Match',
        code: header === undefined ? 'required' : 'malformed',
        message: 'name the revision that was read in the header If-Match',
        found: header ?? 'nothing',
        allowed: 'a revision in quotes, as "3"',
      },
    ])
  }
  return Number(match[1])
}

const cursorSchema = z.tuple([z.union([z.string(), z.number()]), z.string()])
const pageSchema = z.object({
  limit: z.coerce.number().int().min(1).max(pageLimit.most).default(pageLimit.usual),
  cursor: z
    .string()
    .max(1000)
    .transform((text, check) => {
      const read = cursorSchema.safeParse(decode(text))
      if (read.success) return read.data
      check.addIssue('not a cursor of this list')
      return z.NEVER
    })
    .nullable()
    .default(null),
})

/** `?cursor=&limit=` of a list. */
export function parsePage(request: Request): PageRequest {
  const read = pageSchema.safeParse(request.query)
  if (!read.success) throw new InvalidError('This page of the list cannot be found.', toIssues(read.error))
  return { limit: read.data.limit, after: read.data.cursor }
}

function decode(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString())
  } catch {
    // Not JSON, so not a cursor: the schema says so.
    return undefined
  }
}
