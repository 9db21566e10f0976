import { describe, expect, it } from 'vitest'
import { migrateDocument, presentFormat, type MigrationSteps } from '#shared/document/migrate.ts'

/** A format that never was: 1 called the load P and had it in kN, 2 named it, 3 is in N. */
const steps: MigrationSteps = {
  1: ({ P, ...rest }) => ({ ...rest, load: P }),
  2: ({ load, ...rest }) => ({ ...rest, load: Number(load) * 1000 }),
}

describe('bringing older documents forward', () => {
  it('takes every step from the version of the document to the present one', () => {
    const old = { format: 'girdwell-analysis/1', P: 5 }
    expect(migrateDocument(old, 3, steps)).toEqual({
      status: 'present',
      document: { format: 'girdwell-analysis/3', load: 5000 },
    })
    expect(old).toEqual({ format: 'girdwell-analysis/1', P: 5 })
    expect(migrateDocument({ format: 'girdwell-analysis/2', load: 7 }, 3, steps)).toMatchObject({
      document: { load: 7000 },
    })
    expect(migrateDocument({ format: 'girdwell-analysis/3', load: 7000 }, 3, steps)).toMatchObject({
      document: { load: 7000 },
    })
  })

  it('takes a document without format for version 1', () => {
    expect(migrateDocument({ P: 5 }, 3, steps)).toMatchObject({ document: { load: 5000 } })
    expect(migrateDocument({ format: undefined, P: 5 }, 3, steps)).toMatchObject({ document: { load: 5000 } })
  })

  it.each([
    ['girdwell-analysis/4', '"girdwell-analysis/4"'],
    ['girdwell-analysis/0', '"girdwell-analysis/0"'],
    ['girdwell-analysis/-1', '"girdwell-analysis/-1"'],
    ['girdwell-analysis/1e0', '"girdwell-analysis/1e0"'],
    ['girdwell-analysis/ 1', '"girdwell-analysis/ 1"'],
    ['girdwell-analysis/', '"girdwell-analysis/"'],
    ['girdwell-result/1', '"girdwell-result/1"'],
    [1, '1'],
    [null, 'null'],
    [{}, 'an object'],
    [1n, 'a bigint'],
  ])('refuses %s', (format, found) => {
    expect(migrateDocument({ format }, 3, steps)).toEqual({
      status: 'unknown-format',
      found,
      allowed: 'girdwell-analysis/1 to girdwell-analysis/3',
    })
  })

  it('a step that is missing is a fault of the program', () => {
    expect(() => migrateDocument({ format: 'girdwell-analysis/1' }, 4, { 1: steps[1] })).toThrow(
      'No migration from format 2 to 3, though 4 is the present one',
    )
  })

  it('the register reaches from version 1 to the present format', () => {
    expect(migrateDocument({ section: 1 })).toEqual({
      status: 'present',
      document: { format: presentFormat, section: 1 },
    })
  })
})
