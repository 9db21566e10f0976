import type { Sqlite } from './client.ts'

/** Triggers of the custom migrations, by name. A rebuilt table loses its triggers; its migration must make them anew. */
export const guards = [
  'sheets_no_update',
  'sheets_no_delete',
  'sheet_events_no_update',
  'sheet_events_no_delete',
] as const

export function assertGuards(sqlite: Sqlite): void {
  const standing = new Set(
    sqlite.prepare<[], string>(`select name from sqlite_master where type = 'trigger'`).pluck().all(),
  )
  const missing = guards.filter((name) => !standing.has(name))
  if (missing.length > 0) {
    throw new Error(
      `The database has lost the guards of what must never change: ${missing.join(', ')}. ` +
        'A migration that rebuilds their table must create them again.',
    )
  }
}
