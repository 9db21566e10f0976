import { cpSync, existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import SqliteDatabase from 'better-sqlite3'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { inTransaction, openDatabase, type Database } from '#server/db/client.ts'
import { guards } from '#server/db/guards.ts'
import { migrateDatabase } from '#server/db/migrate.ts'
import { migrationsFolder } from '#server/folders.ts'
import { insertJob } from '#server/repositories/jobs.ts'
import { putMember } from '#server/repositories/members.ts'
import { insertUser } from '#server/repositories/users.ts'

let folder: string
let file: string
let open: Database[] = []
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'girdwell-db-'))
  file = join(folder, 'girdwell.sqlite')
})
afterEach(() => {
  for (const database of open) database.$client.close()
  open = []
  rmSync(folder, { recursive: true })
})

function openAt(path: string): Database {
  const database = openDatabase(path)
  open.push(database)
  return database
}
const backups = () => join(folder, 'backups')
const migrate = (database: Database, migrations = migrationsFolder) =>
  migrateDatabase(database, { migrationsFolder: migrations, backupFolder: backups() })

/** Our migrations and one more, as a later version would ship them. */
function withMigration(tag: string, sql: string): string {
  const later = join(folder, 'migrations')
  cpSync(migrationsFolder, later, { recursive: true })
  const journalFile = join(later, 'meta', '_journal.json')
  const journal = JSON.parse(readFileSync(journalFile, 'utf8'))
  const last = journal.entries.at(-1)
  journal.entries.push({ ...last, idx: last.idx + 1, when: last.when + 1, tag })
  writeFileSync(journalFile, JSON.stringify(journal))
  writeFileSync(join(later, `${tag}.sql`), sql)
  return later
}

/** What drizzle-kit writes to change a column: the table is made anew, filled, dropped and renamed. */
const rebuildJobs = `PRAGMA foreign_keys=OFF;--> statement-breakpoint
CREATE TABLE __new_jobs (id text PRIMARY KEY NOT NULL, title text NOT NULL, number text,
  revision integer NOT NULL, created_by text NOT NULL REFERENCES users(id), created_from text NOT NULL,
  created_at integer NOT NULL, changed_at integer NOT NULL);--> statement-breakpoint
INSERT INTO __new_jobs SELECT * FROM jobs;--> statement-breakpoint
DROP TABLE jobs;--> statement-breakpoint
ALTER TABLE __new_jobs RENAME TO jobs;--> statement-breakpoint
PRAGMA foreign_keys=ON;`

function fill(database: Database): void {
  inTransaction(database, (tx) => {
    insertUser(tx, {
      id: 'u1',
      name: 'Rosa Marchetti',
      initials: 'RM',
      email: 'rosa@columns.test',
      passwordHash: 'x',
      role: 'member',
      active: true,
      demo: false,
      createdFrom: null,
      createdAt: 1,
    })
    const job = { title: 'Tern Creek Crossing', number: 'TC-1', revision: 1, createdAt: 1, changedAt: 1 }
    insertJob(tx, { id: 'j1', ...job, createdBy: 'u1', createdFrom: '' })
    putMember(tx, 'j1', 'u1', 'designer')
  })
}

describe('a new database', () => {
  it('gets every table and guard, without a copy of nothing', () => {
    const database = openAt(file)
    expect(migrate(database)).toEqual({ applied: 2, backup: null })
    const names = database.$client.prepare('select name from sqlite_master').pluck().all()
    expect(names).toEqual(
      expect.arrayContaining([
        'users',
        'sign_in_sessions',
        'jobs',
        'members',
        'sections',
        'sheets',
        'sheet_events',
        'links',
        ...guards,
      ]),
    )
    expect(migrate(database)).toEqual({ applied: 0, backup: null })
  })

  it('runs with the pragmas that it relies on', () => {
    const { $client } = openAt(file)
    const read = (name: string) => $client.pragma(name, { simple: true })
    expect(read('journal_mode')).toBe('wal')
    expect(read('foreign_keys')).toBe(1)
    expect(read('busy_timeout')).toBe(5000)
    expect(read('synchronous')).toBe(2)
    expect(read('recursive_triggers')).toBe(1)
  })
})

describe('an old database', () => {
  it('keeps its child rows when a parent table is rebuilt, and leaves a copy of what it was', () => {
    const database = openAt(file)
    migrate(database)
    fill(database)
    const outcome = migrate(database, withMigration('0002_later', rebuildJobs))
    expect(outcome.applied).toBe(1)
    const { $client } = database
    expect($client.prepare('select job_id, user_id, role from members').all()).toEqual([
      { job_id: 'j1', user_id: 'u1', role: 'designer' },
    ])
    expect($client.prepare('select title from jobs').pluck().all()).toEqual(['Tern Creek Crossing'])
    // The rebuilt table is the one the children refer to, and the references hold again.
    expect($client.pragma('foreign_keys', { simple: true })).toBe(1)
    expect(() => $client.exec(`delete from jobs`)).toThrow(/FOREIGN KEY/)

    const copy = new SqliteDatabase(outcome.backup ?? '', { readonly: true })
    expect(copy.prepare('select count(*) from members').pluck().get()).toBe(1)
    const [number] = copy
      .prepare(`select "notnull" from pragma_table_info('jobs') where name = 'number'`)
      .pluck()
      .all()
    expect(number).toBe(1)
    copy.close()
    expect(readdirSync(backups())).toHaveLength(1)
  })

  it('is left as it was by a migration that fails', () => {
    const database = openAt(file)
    migrate(database)
    fill(database)
    const broken = withMigration(
      '0002_later',
      'DROP TABLE members;--> statement-breakpoint\nDROP TABLE nothing;',
    )
    expect(() => migrate(database, broken)).toThrow()
    expect(database.$client.prepare('select count(*) from members').pluck().get()).toBe(1)
    expect(database.$client.pragma('foreign_keys', { simple: true })).toBe(1)
  })

  it('whose rows lost their parents in a migration stops the start and names the copy', () => {
    const database = openAt(file)
    migrate(database)
    fill(database)
    const careless = withMigration('0002_later', 'DELETE FROM jobs;')
    expect(() => migrate(database, careless)).toThrow(/members to jobs.*backups/)
  })

  it('that lost a guard stops the start and names it', () => {
    const database = openAt(file)
    migrate(database)
    database.$client.exec('drop trigger sheets_no_update')
    expect(() => migrate(database)).toThrow(/sheets_no_update/)
  })

  it('of a newer version is not touched', () => {
    const database = openAt(file)
    migrate(database, withMigration('0002_later', rebuildJobs))
    expect(() => migrate(database)).toThrow(/newer Girdwell/)
    expect(existsSync(backups())).toBe(false)
  })
})

describe('a transaction', () => {
  it('that throws leaves nothing behind', () => {
    const database = openAt(file)
    migrate(database)
    expect(() =>
      inTransaction(database, (tx) => {
        putMember(tx, 'nowhere', 'nobody', 'viewer')
      }),
    ).toThrow(/FOREIGN KEY/)
    fill(database)
    expect(() =>
      inTransaction(database, (tx) => {
        putMember(tx, 'j1', 'u1', 'viewer')
        throw new Error('changed my mind')
      }),
    ).toThrow('changed my mind')
    expect(database.$client.prepare('select role from members').pluck().all()).toEqual(['designer'])
  })
})
