import { createHash, randomBytes } from 'node:crypto'
import {
  longestLinkLife,
  type CreatedLink,
  type LinkedSheet,
  type NewLink,
  type SheetLink,
} from '#shared/api.ts'
import type { SignedIn } from '../auth/sessions.ts'
import type { Context } from '../context.ts'
import { inTransaction, type Reader } from '../db/client.ts'
import { IdTakenError, InvalidError, LinkEndedError, NotFoundError } from '../errors.ts'
import {
  findLink,
  findLinkByTokenHash,
  findLinkOrigin,
  insertLink,
  replaceToken,
  setRevoked,
} from '../repositories/links.ts'
import { findSheet } from '../repositories/sheets.ts'
import { requireDesigner, requireDesignerOrAdministrator } from './access.ts'
import { isRetry, type Created } from './creation.ts'
import { toFingerprint } from './fingerprint.ts'
import { recordSheetEvent, seeSheet, toSheetContent } from './sheets.ts'

type Uses = Pick<Context, 'database' | 'now'>

/** ms in which a repeated request counts as a retry whose first answer was lost. */
const retryTime = 10 * 60 * 1000

/**
 * Makes a link to a sheet. The token is told here and never again, its hash alone is stored: a retry cannot
 * get the same one, so it gets a new one in place of the one that was lost on the way.
 */
export function makeLink(
  { database, now }: Uses,
  person: SignedIn,
  sheetId: string,
  asked: NewLink,
): Created<CreatedLink> {
  const { id, recipient, expiresAt } = asked
  const origin = { createdBy: person.id, createdFrom: toFingerprint({ sheetId, recipient, expiresAt }) }
  const token = randomBytes(32).toString('base64url')
  return inTransaction(database, (tx) => {
    const { job } = seeSheet(tx, person, sheetId)
    requireDesigner(job, 'make a link to a sheet')
    const at = now()
    if (isRetry(findLinkOrigin(tx, id), origin, 'link')) {
      const stored = readLink(tx, id)
      if (stored.revokedAt !== null || at - stored.createdAt > retryTime) throw new IdTakenError('link')
      replaceToken(tx, id, toTokenHash(token))
      return { item: { ...stored, token }, fresh: false }
    }
    checkExpiry(expiresAt, at)
    insertLink(tx, {
      id,
      sheetId,
      tokenHash: toTokenHash(token),
      recipient,
      ...origin,
      createdAt: at,
      expiresAt,
      revokedAt: null,
      revokedBy: null,
    })
    recordSheetEvent(tx, sheetId, person, at, { kind: 'link-made', text: `Link made for ${recipient}` })
    return { item: { ...readLink(tx, id), token }, fresh: true }
  })
}

/** Ends a link; one that was revoked before stays as it is. */
export function revokeLink({ database, now }: Uses, person: SignedIn, linkId: string): SheetLink {
  return inTransaction(database, (tx) => {
    const link = readLink(tx, linkId)
    const { job } = seeSheet(tx, person, link.sheetId, 'link')
    requireDesignerOrAdministrator(job, person, 'revoke a link')
    if (link.revokedAt !== null) return link
    const at = now()
    setRevoked(tx, linkId, at, person.id)
    recordSheetEvent(tx, link.sheetId, person, at, {
      kind: 'link-revoked',
      text: `Link for ${link.recipient} revoked`,
    })
    return readLink(tx, linkId)
  })
}

/** What the bearer of a token may read. Says of an ended link how it ended and whom to ask, of an unknown one nothing. */
export function openLink({ database, now }: Uses, token: string): LinkedSheet {
  const link = findLinkByTokenHash(database, toTokenHash(token))
  if (link === undefined) throw new NotFoundError('link')
  if (link.revokedAt !== null) {
    throw new LinkEndedError(
      'revoked',
      `This link was revoked. Ask ${link.createdBy}, who sent it, for a new one.`,
    )
  }
  if (link.expiresAt <= now()) {
    throw new LinkEndedError(
      'expired',
      `This link has expired. Ask ${link.createdBy}, who sent it, for a new one.`,
    )
  }
  const row = findSheet(database, link.sheetId)
  if (row === undefined) throw new Error(`link ${link.id} names sheet ${link.sheetId}, which is not stored`)
  return {
    sheet: { ...toSheetContent(database, row), job: { title: row.jobTitle, number: row.jobNumber } },
    recipient: link.recipient,
    expiresAt: link.expiresAt,
  }
}

function readLink(reader: Reader, linkId: string): SheetLink {
  const link = findLink(reader, linkId)
  if (link === undefined) throw new NotFoundError('link')
  return link
}

/** A token has 256 random bits and cannot be guessed, so it needs no slow hash as a password does. */
function toTokenHash(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}

function checkExpiry(expiresAt: number, at: number): void {
  const message =
    expiresAt <= at
      ? 'The link must end in the future'
      : expiresAt > at + longestLinkLife
        ? 'The link must end within a year'
        : null
  if (message !== null) {
    throw new InvalidError('The link cannot be made so.', [
      { path: 'expiresAt', code: 'out-of-range', message },
    ])
  }
}
