import { describe, expect, it } from 'vitest'
import { formatIssue, parseDocumentText, readDocument } from '#shared/document/readDocument.ts'
import { loadInput } from '../../../helpers/fixtureDocuments.ts'

/** A document of format 1 with one field set, or taken away where the value is undefined. */
function withField(path: string, value: unknown): unknown {
  const document = loadInput('format-1') as unknown as Record<string, unknown>
  const keys = path.split('.')
  const last = keys.pop() as string
  let owner = document
  for (const key of keys) owner = owner[key] as Record<string, unknown>
  if (value === undefined) delete owner[last]
  else owner[last] = value
  return document
}

function listLines(input: unknown): string[] {
  const outcome = readDocument(input)
  return outcome.status === 'bad' ? outcome.issues.map(formatIssue) : []
}

describe('what a document is refused for, field by field', () => {
  const cases: [why: string, path: string, value: unknown, line: string][] = [
    ['missing object', 'section', undefined, 'section: is missing, found nothing, allowed an object'],
    [
      'missing number',
      'section.spirals.0.pitch',
      undefined,
      'section.spirals[0].pitch: is missing, found nothing, allowed a number',
    ],
    [
      'missing kind',
      'section.outline.kind',
      undefined,
      'section.outline.kind: is missing, found nothing, allowed "circle", "rectangle", "oblong", "polygon"',
    ],
    [
      'text for a number',
      'section.spirals.0.pitch',
      '80',
      'section.spirals[0].pitch: is of the wrong type, found "80", allowed a number',
    ],
    [
      'null for a number',
      'section.spirals.0.pitch',
      null,
      'section.spirals[0].pitch: is of the wrong type, found null, allowed a number',
    ],
    [
      'number for an object',
      'materials.concrete',
      40,
      'materials.concrete: is of the wrong type, found 40, allowed an object',
    ],
    [
      'object for a list',
      'section.bars',
      {},
      'section.bars: is of the wrong type, found an object, allowed a list',
    ],
    [
      'list for steels',
      'materials.steels',
      [1, 2],
      'materials.steels: is of the wrong type, found a list of 2, allowed an object',
    ],
    ['number for text', 'title', 3, 'title: is of the wrong type, found 3, allowed text'],
    [
      'text for true or false',
      'section.voids.0.lining',
      'yes',
      'section.voids[0].lining: is of the wrong type, found "yes", allowed true or false',
    ],
    [
      'number for a point',
      'section.spirals.0.centre',
      0,
      'section.spirals[0].centre: is of the wrong type, found 0, allowed a list [x, y]',
    ],
    [
      'three coordinates',
      'section.spirals.0.centre',
      [0, 0, 0],
      'section.spirals[0].centre: has too many entries, found 3, allowed at most 2',
    ],
    [
      'one coordinate',
      'section.spirals.0.centre',
      [0],
      'section.spirals[0].centre: has too few entries, found 1, allowed at least 2',
    ],
    [
      'infinite load',
      'analysis.axialLoad',
      Infinity,
      'analysis.axialLoad: is not a finite number, found Infinity, allowed a finite number',
    ],
    [
      'no number',
      'section.outline.diameter',
      Number.NaN,
      'section.outline.diameter: is not a finite number, found NaN, allowed a finite number',
    ],
    [
      'negative size',
      'section.outline.diameter',
      -1200,
      'section.outline.diameter: is too small, found -1200, allowed at least 1',
    ],
    [
      'size in the wrong unit',
      'section.outline.diameter',
      1.2e6,
      'section.outline.diameter: is too large, found 1200000, allowed at most 100000',
    ],
    [
      'strength in the wrong unit',
      'materials.concrete.strength',
      40e6,
      'materials.concrete.strength: is too large, found 40000000, allowed at most 300',
    ],
    [
      'strain in per cent',
      'materials.steels.L.limitStrain',
      9,
      'materials.steels.L.limitStrain: is too large, found 9, allowed at most 1',
    ],
    [
      'half a bar',
      'section.bars.0.layout.count',
      20.5,
      'section.bars[0].layout.count: is of the wrong type, found 20.5, allowed a whole number',
    ],
    [
      'absurd count',
      'section.bars.0.layout.count',
      1e300,
      'section.bars[0].layout.count: is too large, found 1e+300, allowed at most 2000',
    ],
    ['too few rows', 'analysis.points', 50, 'analysis.points: is too small, found 50, allowed at least 100'],
    [
      'unknown law',
      'materials.steels.L.law',
      'ramberg',
      'materials.steels.L.law: has a value that is not known, found "ramberg", allowed "menegotto-pinto", "plateau-hardening", "elastic-plastic"',
    ],
    [
      'unknown form',
      'section.spirals.0.form',
      'coil',
      'section.spirals[0].form: has a value that is not known, found "coil", allowed "spiral", "hoop"',
    ],
    [
      'unknown kind',
      'analysis.kind',
      'guess',
      'analysis.kind: has a value that is not known, found "guess", allowed "moment-curvature"',
    ],
    [
      'unknown field at the top',
      'author',
      'me',
      'author: is not a field that can stand here, found "me", allowed nothing under this name',
    ],
    [
      'unknown field within',
      'section.spirals.0.picth',
      80,
      'section.spirals[0].picth: is not a field that can stand here, found 80, allowed nothing under this name',
    ],
    [
      'field of another law',
      'materials.steels.T.hardeningRatio',
      0.01,
      'materials.steels.T.hardeningRatio: is not a field that can stand here, found 0.01, allowed nothing under this name',
    ],
    [
      'empty name',
      'section.spirals.0.id',
      '  ',
      'section.spirals[0].id: is too short, found 2 characters, allowed at least 1 characters',
    ],
    [
      'long title',
      'title',
      'x'.repeat(201),
      'title: is too long, found 201 characters, allowed at most 200 characters',
    ],
    [
      'steel name with a blank at its end',
      'materials.steels.L ',
      { law: 'elastic-plastic', yieldStrength: 400 },
      'materials.steels.L : stands under a name that cannot be used, found "L ", allowed a name of 1 to 80 characters without blanks at its ends',
    ],
    ['notes that are not text', 'notes.a', 1, 'notes.a: is of the wrong type, found 1, allowed text'],
    [
      'two corners',
      'section.outline',
      {
        kind: 'polygon',
        points: [
          [0, 0],
          [1, 1],
        ],
      },
      'section.outline.points: has too few entries, found 2, allowed at least 3',
    ],
    [
      'format of the future',
      'format',
      'girdwell-analysis/2',
      'format: is not known, found "girdwell-analysis/2", allowed girdwell-analysis/1',
    ],
    [
      'another format',
      'format',
      'table/1',
      'format: is not known, found "table/1", allowed girdwell-analysis/1',
    ],
    [
      'format with other digits',
      'format',
      'girdwell-analysis/1.0',
      'format: is not known, found "girdwell-analysis/1.0", allowed girdwell-analysis/1',
    ],
    ['format null', 'format', null, 'format: is not known, found null, allowed girdwell-analysis/1'],
  ]
  it.each(cases)('%s', (_why, path, value, line) => {
    expect(listLines(withField(path, value))).toEqual([line])
  })

  it.each([
    ['missing', 'section.spirals.0.pitch', undefined],
    ['wrong-type', 'section.spirals.0.pitch', '80'],
    ['not-finite', 'analysis.axialLoad', Infinity],
    ['too-small', 'section.outline.diameter', -1200],
    ['too-large', 'section.outline.diameter', 1.2e6],
    ['not-allowed', 'section.spirals.0.form', 'coil'],
    ['unknown-field', 'section.spirals.0.picth', 80],
    ['bad-name', 'materials.steels.L ', { law: 'elastic-plastic', yieldStrength: 400 }],
    ['unknown-format', 'format', 'table/1'],
  ])('the code %s stands with path, found and allowed', (code, path, value) => {
    const outcome = readDocument(withField(path, value))
    expect(outcome).toEqual({
      status: 'bad',
      issues: [
        {
          path: path.replace('.0', '[0]'),
          code,
          message: expect.stringMatching(/./),
          found: expect.stringMatching(/./),
          allowed: expect.stringMatching(/./),
        },
      ],
    })
  })

  it('tells everything that is wrong at once', () => {
    const document = withField('section.spirals.0.pitch', 'wide') as { materials: { concrete: object } }
    document.materials.concrete = {}
    expect(listLines(document)).toEqual([
      'section.spirals[0].pitch: is of the wrong type, found "wide", allowed a number',
      'materials.concrete.strength: is missing, found nothing, allowed a number',
    ])
  })

  it('shortens long values and keeps to one line', () => {
    const lines = listLines(withField('section.spirals.0.form', `a\nb\u2028c${'d'.repeat(100)}`))
    expect(lines).toHaveLength(1)
    expect(lines[0]).not.toMatch(/[\n\u2028]/u)
    expect(lines[0].length).toBeLessThan(160)
    const named = listLines(withField('materials.steels', { 'a\nb': 5 }))
    expect(named).toEqual(['materials.steels.a b: is of the wrong type, found 5, allowed an object'])
  })
})

describe('a document as a whole', () => {
  it.each([
    ['null', null, 'null'],
    ['a list', [1], 'a list of 1'],
    ['text', 'section', '"section"'],
    ['nothing', undefined, 'nothing'],
    ['a number', 7, '7'],
  ])('%s is not a document', (_name, input, found) => {
    expect(listLines(input)).toEqual([
      `(document): is not an analysis document, found ${found}, allowed an object with section, materials and analysis`,
    ])
  })

  it('text that is not JSON is told with what the parser said', () => {
    const outcome = parseDocumentText('{"section": ')
    expect(outcome).toMatchObject({
      status: 'bad',
      issues: [{ path: '(document)', code: 'not-json', message: 'is not JSON', allowed: 'one JSON object' }],
    })
  })

  it('a byte order mark before the JSON does no harm', () => {
    const text = JSON.stringify(loadInput('one-spiral'))
    expect(parseDocumentText(`\uFEFF${text}`)).toEqual(parseDocumentText(text))
  })

  it('a number beyond the range of doubles is told as such', () => {
    const text = JSON.stringify(loadInput('one-spiral')).replace('"axialLoad":6000000', '"axialLoad":1e999')
    expect(parseDocumentText(text)).toMatchObject({
      issues: [{ path: 'analysis.axialLoad', code: 'not-finite', found: 'Infinity' }],
    })
  })

  it('without format, 1 is assumed', () => {
    expect(readDocument(withField('format', undefined))).toEqual(readDocument(loadInput('format-1')))
  })
})
