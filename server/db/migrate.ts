import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import { readMigrationFiles } from 'drizzle-orm/migrator'
import type { Database, Sqlite } from './client.ts'
import { assertGuards } from './guards.ts'

export interface MigrateOptions {
  migrationsFolder: string
  /** Where the copy goes that is made before an existing database is migrated; null: none (a database in memory). */
  backupFolder: string | null
}

export interface MigrateOutcome {
  applied: number
  /** Path of the copy, null when nothing was at stake. */
  backup: string | null
}

/**
 * Brings the database to this program's schema. An existing database is copied first. Foreign keys are off
 * meanwhile, since a table rebuilt under them would take its child rows with it, and are checked afterwards.
 */
export function migrateDatabase(database: Database, options: MigrateOptions): MigrateOutcome {
  const sqlite = database.$client
  const known = readMigrationFiles({ migrationsFolder: options.migrationsFolder }).map(
    (migration) => migration.folderMillis,
  )
  const last = findLastApplied(sqlite)
  if (last !== null && last > Math.max(...known)) {
    throw new Error(
      'This database was written by a newer Girdwell. Start that version, or name another folder in GIRDWELL_DATA.',
    )
  }
  const pending = known.filter((made) => last === null || made > last).length
  const backup =
    pending > 0 && last !== null && options.backupFolder !== null
      ? backUp(sqlite, options.backupFolder)
      : null

  if (pending > 0) {
    // Has no effect inside the transaction that the migrator opens, so it stands here.
    sqlite.pragma('foreign_keys = OFF')
    try {
      migrate(database, { migrationsFolder: options.migrationsFolder })
      assertForeignKeys(sqlite, backup)
    } finally {
      sqlite.pragma('foreign_keys = ON')
    }
  }
  assertGuards(sqlite)
  return { applied: pending, backup }
}

/** Time stamp of the last applied migration, UTC ms; null in a new database. */
function findLastApplied(sqlite: Sqlite): number | null {
  const table = sqlite
    .prepare(`select 1 from sqlite_master where type = 'table' and name = '__drizzle_migrations'`)
    .get()
  if (table === undefined) return null
  const last = sqlite.prepare('select max(created_at) from __drizzle_migrations').pluck().get()
  return last === null || last === undefined ? null : Number(last)
}

/** A whole and consistent copy, WAL included. */
function backUp(sqlite: Sqlite, folder: string): string {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const moment = new Date().toISOString().replace(/[:.]/g, '-')
  const file = join(folder, `girdwell-before-migration-${moment}.sqlite`)
  sqlite.prepare('vacuum into ?').run(file)
  return file
}

function assertForeignKeys(sqlite: Sqlite, backup: string | null): void {
  const broken = sqlite.pragma('foreign_key_check') as { table: string; parent: string }[]
  if (broken.length === 0) return
  const pairs = [...new Set(broken.map((row) => `${row.table} to ${row.parent}`))].join(', ')
  throw new Error(
    `The migration left ${broken.length} rows without the row they refer to (${pairs}).` +
      (backup === null ? '' : ` The database as it was before is ${backup}.`),
  )
}
