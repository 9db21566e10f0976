import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { createSessions, type Sessions } from './auth/sessions.ts'
import type { Config } from './config.ts'
import { openDatabase, type Database } from './db/client.ts'
import { migrateDatabase } from './db/migrate.ts'
import { migrationsFolder } from './folders.ts'
import { createLog, type Logger } from './log.ts'
import { createVerifier, type Verifier } from './services/verification.ts'

/** What the application is made of, wired by hand. */
export interface Context {
  config: Config
  log: Logger
  database: Database
  sessions: Sessions
  verifier: Verifier
  /** UTC ms. */
  now: () => number
  close: () => Promise<void>
}

/** Parts that a test puts in place of the real ones. */
export interface ContextParts {
  /** A file or `:memory:`; by default the file in the data folder. */
  databaseFile?: string
  log?: Logger
  verifier?: Verifier
  now?: () => number
}

/** Opens everything the application needs; the database is migrated when this returns. */
export function createContext(config: Config, parts: ContextParts = {}): Context {
  const log = parts.log ?? createLog(config.logLevel)
  const database = openMigrated(config, parts.databaseFile, log)
  const verifier = parts.verifier ?? createVerifier({ timeLimit: config.solverTimeLimit })
  return {
    config,
    log,
    database,
    sessions: createSessions(database, { secure: isSecure(config) }),
    verifier,
    now: parts.now ?? Date.now,
    async close() {
      await verifier.close()
      database.$client.close()
    },
  }
}

/** Whether people reach the server through TLS. */
export function isSecure(config: Config): boolean {
  return config.publicUrl?.protocol === 'https:'
}

function openMigrated(config: Config, databaseFile: string | undefined, log: Logger): Database {
  if (databaseFile === undefined) mkdirSync(config.dataFolder, { recursive: true, mode: 0o700 })
  const database = openDatabase(databaseFile ?? join(config.dataFolder, 'girdwell.sqlite'))
  const outcome = migrateDatabase(database, {
    migrationsFolder,
    backupFolder: databaseFile === ':memory:' ? null : join(config.dataFolder, 'backups'),
  })
  if (outcome.backup !== null) log.warn({ ...outcome }, 'database migrated; a copy of the old one was kept')
  return database
}
