import SqliteDatabase from 'better-sqlite3'
import { drizzle, type BetterSQLite3Database } from 'drizzle-orm/better-sqlite3'

export type Sqlite = SqliteDatabase.Database
export type Database = BetterSQLite3Database & { $client: Sqlite }
/** What a write asks for: only `inTransaction` hands one out, so a write outside a transaction does not compile. */
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]
/** What a query asks for: the database, or a transaction to read what it has just written. */
export type Reader = Database | Transaction

/** Opens or creates the database; `:memory:` for tests. */
export function openDatabase(file: string): Database {
  const sqlite = new SqliteDatabase(file)
  // Readers do not wait for the writer, and a copy can be taken while the server runs.
  sqlite.pragma('journal_mode = WAL')
  // A sheet that was answered with 201 must outlive a power cut; WAL with NORMAL could lose the last commits.
  sqlite.pragma('synchronous = FULL')
  // Off by default in SQLite, and per connection.
  sqlite.pragma('foreign_keys = ON')
  // Another process may hold the file for a moment: a second server that is starting, a backup.
  sqlite.pragma('busy_timeout = 5000')
  // INSERT OR REPLACE deletes the old row; only with this do the triggers that guard sheets see it.
  sqlite.pragma('recursive_triggers = ON')
  // Views and triggers of a file that someone else prepared call no function with side effects.
  sqlite.pragma('trusted_schema = OFF')
  // Not tuned, no need measured: cache_size, mmap_size, page_size.
  return drizzle({ client: sqlite })
}

/** Runs the body as one write transaction. It is synchronous, as the driver is: no `await` inside. */
export function inTransaction<T>(database: Database, body: (tx: Transaction) => T): T {
  // Immediate: takes the write lock at once instead of failing half-way when a read lock cannot be raised.
  return database.transaction(body, { behavior: 'immediate' })
}
