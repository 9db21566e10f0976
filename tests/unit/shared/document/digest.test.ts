import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { computeDigest, toCanonicalJson } from '#shared/document/digest.ts'
import {
  fixtureDigests,
  fixtureNames,
  loadDigested,
  loadFixture,
  loadInput,
  readSound,
} from '../../../helpers/fixtureDocuments.ts'

const digestOf = (input: unknown) => computeDigest(readSound(input))

describe('the digest', () => {
  // tests/fixtures/documents/makeDigests.mjs: own defaults and canonical form, node:crypto.
  it.each(Object.entries(fixtureDigests))(
    'of %s is the one that was made without our packages',
    (name, digest) => {
      expect(digestOf(loadDigested(name))).toBe(digest)
    },
  )

  it('stands for every fixture, every layout and every section with exact results', () => {
    const names = Object.keys(fixtureDigests)
    expect(names).toEqual(expect.arrayContaining([...fixtureNames]))
    expect(names.filter((name) => name.startsWith('layout-'))).toHaveLength(layouts.length)
    expect(names.filter((name) => /^p\d-/.test(name))).toHaveLength(3)
    for (const name of fixtureNames) {
      expect(digestOf(loadFixture(`${name}.filled`)), name).toBe(fixtureDigests[name])
    }
  })

  it.each(layouts.map((layout) => [layout.id, layout] as const))(
    'of the layout %s is that of its fixture',
    (id, layout) => {
      expect(digestOf(layout.create())).toBe(fixtureDigests[`layout-${id}`])
    },
  )

  it('is sha-256 in hex over the canonical form in UTF-8', () => {
    const document = readSound(loadInput('octagon-hoop'))
    const canonical = toCanonicalJson(document)
    expect(canonical).toContain('Längste Last ≥ 1.9 MN')
    const hex = createHash('sha256').update(canonical, 'utf8').digest('hex')
    expect(computeDigest(document)).toBe(`sha256:${hex}`)
  })

  it('title and notes are left out', () => {
    const document = loadInput('format-1')
    const digest = digestOf(document)
    expect(digestOf({ ...document, title: 'other', notes: { x: 'y' } })).toBe(digest)
    expect(toCanonicalJson(readSound(document))).not.toContain('Pier 3')
  })

  it('defaults given or absent are the same', () => {
    const digest = digestOf(loadInput('one-spiral'))
    const spelled = loadFixture('one-spiral.filled') as Record<string, unknown>
    expect(digestOf(spelled)).toBe(digest)
    const { cases, format, ...rest } = spelled
    expect(cases).toEqual([])
    expect(format).toBe('girdwell-analysis/1')
    expect(digestOf(rest)).toBe(digest)
  })

  it('0 is -0, and 360 is 0 degrees, but the order of lists counts', () => {
    const change = (edit: (document: AnalysisDocument) => void) => {
      const document = loadFixture('octagon-hoop.filled') as AnalysisDocument
      edit(document)
      return digestOf(document)
    }
    const digest = change(() => {})
    expect(change(({ section }) => (section.spirals[0].centre = [-0, -0]))).toBe(digest)
    expect(change(({ cases }) => (cases[0].angle = 405))).toBe(digest)
    expect(change(({ analysis }) => (analysis.angle = -90))).toBe(digest)
    expect(change(({ section }) => section.bars.reverse())).not.toBe(digest)
    expect(change(({ cases }) => cases.reverse())).not.toBe(digest)
  })
})

describe('the canonical form', () => {
  /** A document only in name: the canonical form takes any content. */
  const canonical = (section: unknown) =>
    toCanonicalJson({ section } as AnalysisDocument).slice('{"section":'.length, -1)

  it('writes numbers and text as RFC 8785, section 3.2.2, has it', () => {
    const example = {
      numbers: JSON.parse(
        '[333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001]',
      ) as number[],
      string: '\u20ac$\u000f\u000aA\'\u0042\u0022\u005c\\"/',
      literals: [null, true, false],
    }
    expect(canonical(example)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    )
  })

  it('sorts fields by their UTF-16 code units, as RFC 8785, section 3.2.3, has it', () => {
    const example = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    }
    const values = [...canonical(example).matchAll(/:"([^"]*)"/g)].map((found) => found[1])
    expect(values).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ])
  })
})
