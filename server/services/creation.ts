import { IdTakenError } from '../errors.ts'

/** What was made, and whether just now or by an earlier try of the same request. */
export interface Created<T> {
  item: T
  fresh: boolean
}

/** Who made a thing, and from which request. */
export interface Origin {
  createdBy: string
  createdFrom: string | null
}

/** True when the id's owner is an earlier try of the same request; false when the id is free; throws otherwise. */
export function isRetry(origin: Origin | undefined, expected: Origin, what: string): boolean {
  if (origin === undefined) return false
  if (origin.createdBy === expected.createdBy && origin.createdFrom === expected.createdFrom) return true
  throw new IdTakenError(what)
}
