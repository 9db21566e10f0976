import { sql } from 'drizzle-orm'
import type { Reader } from '../db/client.ts'

/** Throws when the database cannot be read. */
export function readPulse(reader: Reader): void {
  reader.get(sql`select count(*) from users`)
}
