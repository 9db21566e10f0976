import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { computeDigest } from '#shared/document/digest.ts'
import { formatIssue, parseDocumentText, readDocument } from '#shared/document/readDocument.ts'
import { documentArbitrary } from '../../../helpers/documentArbitrary.ts'
import { loadInput, readSound } from '../../../helpers/fixtureDocuments.ts'

const seed = 20_261_201

type Json = { [key: string]: Json } | Json[] | string | number | boolean | null

/** The same value with the fields of every object in another order. */
function turnKeys(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(turnKeys)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, inner]) => [key, turnKeys(inner)]),
  )
}

/** Every place in a document, as keys from the top. */
function listPlaces(value: unknown): (string | number)[][] {
  if (typeof value !== 'object' || value === null) return [[]]
  const fields = Array.isArray(value) ? value.map((inner, i) => [i, inner] as const) : Object.entries(value)
  return [[], ...fields.flatMap(([key, inner]) => listPlaces(inner).map((place) => [key, ...place]))]
}

function replaceAt(value: Json, place: readonly (string | number)[], by: unknown): unknown {
  if (place.length === 0) return by
  const [key, ...rest] = place
  const copy = (Array.isArray(value) ? [...value] : { ...(value as object) }) as Record<string | number, Json>
  copy[key] = replaceAt(copy[key], rest, by) as Json
  return copy
}

function expectSoundIssues(outcome: ReturnType<typeof readDocument>): void {
  if (outcome.status === 'read') return
  expect(outcome.issues.length).toBeGreaterThan(0)
  for (const issue of outcome.issues) {
    const line = formatIssue(issue)
    expect(issue.path).not.toBe('')
    expect(issue.found, line).toBeTruthy()
    expect(issue.allowed, line).toBeTruthy()
    expect(line).toMatch(/^[^\n\r\u2028\u2029]+$/u)
  }
}

describe('documents in general', { timeout: 30_000 }, () => {
  it('a filled document reads to itself, with the same digest, also through JSON text', () => {
    fc.assert(
      fc.property(documentArbitrary, (input) => {
        const filled = readSound(input)
        expect(readSound(filled)).toEqual(filled)
        const again = parseDocumentText(JSON.stringify(filled))
        expect(again).toStrictEqual({ status: 'read', document: filled })
        expect(computeDigest(readSound(filled))).toBe(computeDigest(filled))
      }),
      { seed, numRuns: 300 },
    )
  })

  it('the digest knows no order of fields, no title and no notes', () => {
    fc.assert(
      fc.property(documentArbitrary, fc.string({ maxLength: 40 }), (input, title) => {
        const digest = computeDigest(readSound(input))
        expect(computeDigest(readSound(turnKeys(input)))).toBe(digest)
        expect(computeDigest(readSound({ ...input, title, notes: { remark: title } }))).toBe(digest)
      }),
      { seed, numRuns: 200 },
    )
  })

  it('what is read is left as it was', () => {
    fc.assert(
      fc.property(documentArbitrary, (input) => {
        const before = structuredClone(input)
        readDocument(input)
        expect(input).toEqual(before)
      }),
      { seed, numRuns: 100 },
    )
  })

  it('anything at all is answered, never thrown at', () => {
    fc.assert(
      fc.property(
        fc.anything({ withBigInt: true, withDate: true, withMap: true, withTypedArray: true }),
        (junk) => {
          const outcome = readDocument(junk)
          expect(outcome.status).toBe('bad')
          expectSoundIssues(outcome)
        },
      ),
      { seed, numRuns: 1000 },
    )
  })

  it('any text is answered, JSON or not', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.json()), (text) => {
        const outcome = parseDocumentText(text)
        expect(outcome.status).toBe('bad')
        expectSoundIssues(outcome)
      }),
      { seed, numRuns: 500 },
    )
  })

  it('a sound document with junk in one place is answered by issues in plain words, or still sound', () => {
    const base = loadInput('format-1') as unknown as Json
    const places = listPlaces(base)
    const junk = fc.oneof(
      fc.anything({ withBigInt: true }),
      fc.double(),
      fc.constantFrom(undefined, null, Number.NaN, Infinity, -0, '', [], {}, -1, 1e9),
    )
    fc.assert(
      fc.property(fc.constantFrom(...places), junk, (place, by) => {
        expectSoundIssues(readDocument(replaceAt(base, place, by)))
      }),
      { seed, numRuns: 3000 },
    )
  })

  it('every number that determines the result stands in the digest', () => {
    const filled = readSound(loadInput('format-1'))
    const digest = computeDigest(filled)
    const { section, materials, cases, analysis } = filled
    const places = listPlaces({ section, materials, cases, analysis })
    const numbers = places.filter((place) => typeof findAt(filled, place) === 'number')
    expect(numbers.length).toBeGreaterThan(40)
    for (const place of numbers) {
      const value = findAt(filled, place) as number
      const moved = replaceAt(filled as unknown as Json, place, value === 0 ? 1e-9 : value * (1 + 1e-14))
      expect(computeDigest(moved as typeof filled), place.join('.')).not.toBe(digest)
    }
  })
})

function findAt(value: unknown, place: readonly (string | number)[]): unknown {
  return place.reduce<unknown>((inner, key) => (inner as Record<string | number, unknown>)[key], value)
}
