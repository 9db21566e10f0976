import { describe, expect, it } from 'vitest'
import type { Issue } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { AnalysisDocumentInput } from '#shared/document/schema.ts'
import { loadInput } from '../../../helpers/fixtureDocuments.ts'

type Input = AnalysisDocumentInput
type SectionInput = Input['section']
type SpiralInput = NonNullable<SectionInput['spirals']>[number]
type VoidInput = NonNullable<SectionInput['voids']>[number]
type BarGroupInput = NonNullable<SectionInput['bars']>[number]

/** The round column (1.2 m, spiral of 1084 mm, 20 bars of 32 mm on 1036 mm) with its section changed. */
function readSection(change: (section: SectionInput) => void): Issue[] {
  const document = loadInput('one-spiral')
  change(document.section)
  const outcome = readDocument(document)
  return outcome.status === 'bad' ? outcome.issues : []
}

const spiral = (change: Partial<SpiralInput>): SpiralInput => ({
  id: 'S2',
  centre: [0, 0],
  diameter: 400,
  barDiameter: 12,
  pitch: 80,
  form: 'spiral',
  steel: 'T',
  ...change,
})
const hole = (change: Partial<VoidInput>): VoidInput => ({
  kind: 'circle',
  centre: [0, 0],
  diameter: 300,
  ...change,
})
const bars = (layout: BarGroupInput['layout'], barDiameter = 20): BarGroupInput => ({
  layout,
  barDiameter,
  steel: 'L',
})
const atPoints = (...points: [number, number][]) => bars({ kind: 'points', points })

describe('outlines that are refused', () => {
  it('a polygon that crosses itself', () => {
    const issues = readSection((section) => {
      section.outline = {
        kind: 'polygon',
        points: [
          [-800, -800],
          [800, 800],
          [800, -800],
          [-800, 800],
        ],
      }
    })
    expect(issues).toEqual([
      {
        path: 'section.outline.points',
        code: 'self-crossing',
        message: 'cross or touch themselves',
        found: 'sides 1 and 3',
        allowed: 'a simple polygon',
      },
    ])
  })

  it('a corner that stands twice in a row, and the first corner again at the end', () => {
    const square: [number, number][] = [
      [-800, -800],
      [800, -800],
      [800, 800],
      [-800, 800],
    ]
    for (const [points, found] of [
      [[square[0], square[0], ...square.slice(1)], 'corner 1 twice'],
      [[...square, square[0]], 'corner 5 twice'],
    ] as const) {
      const issues = readSection((section) => {
        section.outline = { kind: 'polygon', points: [...points] }
      })
      expect(issues).toMatchObject([{ path: 'section.outline.points', code: 'self-crossing', found }])
    }
  })

  it('a polygon without area', () => {
    const issues = readSection((section) => {
      section.outline = {
        kind: 'polygon',
        points: [
          [0, 0],
          [1000, 0],
          [500, 1e-6],
        ],
      }
    })
    expect(issues).toMatchObject([
      { path: 'section.outline.points', code: 'no-area', found: '0.0005 mm²', allowed: 'at least 1 mm²' },
    ])
  })

  it('a chamfer that leaves no side; one just short of that is sound', () => {
    const withChamfer = (chamfer: number) =>
      readSection((section) => {
        section.outline = { kind: 'rectangle', width: 1600, depth: 1400, chamfer }
        section.spirals = []
        section.bars = [atPoints([0, 0])]
      })
    expect(withChamfer(700)).toEqual([
      {
        path: 'section.outline.chamfer',
        code: 'chamfer',
        message: 'leaves nothing of the sides',
        found: '700 mm',
        allowed: 'less than 700 mm',
      },
    ])
    expect(withChamfer(699.9)).toEqual([])
  })

  it('an oblong may be wide, tall, or as wide as tall', () => {
    for (const [width, depth] of [
      [1850, 1200],
      [1200, 1850],
      [1200, 1200],
    ]) {
      expect(
        readSection((section) => {
          section.outline = { kind: 'oblong', width, depth }
        }),
      ).toEqual([])
    }
  })
})

describe('spirals that are refused', () => {
  it('one whose bar leaves the outline, though its centreline does not', () => {
    const withDiameter = (diameter: number) =>
      readSection((section) => {
        section.spirals = [spiral({ diameter, barDiameter: 16 })]
      })
    // 1184 + 16 touches the circle of 1200 from within.
    expect(withDiameter(1184)).toEqual([])
    expect(withDiameter(1186)).toEqual([
      {
        path: 'section.spirals[0].diameter',
        code: 'outside',
        message: 'spiral S2 leaves the outline',
        found: '1 mm outside',
        allowed: 'wholly inside the outline',
      },
    ])
  })

  it('one at the chamfer of a rectangle', () => {
    const withChamfer = (chamfer: number) =>
      readSection((section) => {
        section.outline = { kind: 'rectangle', width: 1500, depth: 1500, chamfer }
        section.spirals = [spiral({ centre: [485, 485] })]
      })
    expect(withChamfer(60)).toEqual([])
    // Chamfer line x + y = 1500 - 300: (1200 - 970) / sqrt 2 = 162.6 mm from the centre, the spiral needs 206.
    expect(withChamfer(300)).toMatchObject([
      { path: 'section.spirals[0].diameter', code: 'outside', found: '43.4 mm outside' },
    ])
  })

  it('a pitch not larger than the bar', () => {
    const issues = readSection((section) => {
      section.spirals = [spiral({ pitch: 12 }), spiral({ id: 'H', pitch: 11, form: 'hoop' })]
    })
    expect(issues).toEqual([
      {
        path: 'section.spirals[0].pitch',
        code: 'pitch',
        message: 'must be larger than the bar of the spiral',
        found: '12 mm',
        allowed: 'more than 12 mm',
      },
      {
        path: 'section.spirals[1].pitch',
        code: 'pitch',
        message: 'must be larger than the bar of the hoop',
        found: '11 mm',
        allowed: 'more than 12 mm',
      },
    ])
  })

  it('a diameter not larger than the bar', () => {
    const issues = readSection((section) => {
      section.spirals = [spiral({ diameter: 12 })]
    })
    expect(issues).toMatchObject([
      {
        path: 'section.spirals[0].diameter',
        code: 'spiral-diameter',
        found: '12 mm',
        allowed: 'more than 12 mm',
      },
    ])
  })

  it('two of one name', () => {
    const issues = readSection((section) => {
      section.spirals = [spiral({ id: 'A' }), spiral({ id: 'B' }), spiral({ id: ' A ' })]
    })
    expect(issues).toEqual([
      {
        path: 'section.spirals[2].id',
        code: 'duplicate',
        message: 'stands twice, first at section.spirals[0].id',
        found: '"A"',
        allowed: 'a name of its own',
      },
    ])
  })

  it('a wire through a void; round the void or beside it is sound', () => {
    const withSpiral = (change: Partial<SpiralInput>) =>
      readSection((section) => {
        section.voids = [hole({})]
        section.spirals = [spiral(change)]
      })
    expect(withSpiral({ diameter: 312 })).toEqual([])
    expect(withSpiral({ diameter: 150, centre: [231, 0] })).toEqual([])
    for (const change of [
      { diameter: 311 },
      { diameter: 200 },
      { diameter: 150, centre: [230, 0] as [number, number] },
    ]) {
      expect(withSpiral(change)).toMatchObject([
        {
          path: 'section.spirals[0].diameter',
          code: 'spiral-in-void',
          message: 'the wire of spiral S2 passes through void 1',
          found: `${change.diameter} mm`,
          allowed: 'a spiral round the void or clear of it',
        },
      ])
    }
  })

  it('a steel that is not defined, also under a name that every object knows', () => {
    for (const steel of ['X', 'constructor', '__proto__']) {
      const issues = readSection((section) => {
        section.spirals = [spiral({ steel })]
      })
      expect(issues).toEqual([
        {
          path: 'section.spirals[0].steel',
          code: 'unknown-steel',
          message: 'names a steel that is not defined in materials.steels',
          found: JSON.stringify(steel),
          allowed: '"L", "T"',
        },
      ])
    }
  })
})

describe('voids that are refused', () => {
  it('one that leaves or touches the outline', () => {
    const withCentre = (x: number) =>
      readSection((section) => {
        section.spirals = []
        section.bars = []
        section.voids = [hole({ centre: [x, 0] })]
      })
    expect(withCentre(449)).toEqual([])
    expect(withCentre(450)).toMatchObject([
      { path: 'section.voids[0]', code: 'outside', found: '0 mm outside' },
    ])
    expect(withCentre(460)).toEqual([
      {
        path: 'section.voids[0]',
        code: 'outside',
        message: 'the void leaves the outline',
        found: '10 mm outside',
        allowed: 'wholly inside the outline',
      },
    ])
  })

  it('two that overlap', () => {
    const issues = readSection((section) => {
      section.bars = []
      section.voids = [hole({ diameter: 200 }), hole({ diameter: 100, centre: [140, 0] })]
    })
    expect(issues).toEqual([
      {
        path: 'section.voids[1]',
        code: 'voids-overlap',
        message: 'overlaps void 1',
        found: '10 mm overlap',
        allowed: 'voids apart from one another',
      },
    ])
  })
})

describe('bars that are refused', () => {
  const withBars = (...groups: BarGroupInput[]) =>
    readSection((section) => {
      section.bars = groups
    })

  it('a bar whose circle leaves the outline, though its centre does not', () => {
    expect(withBars(atPoints([0, 590]))).toEqual([])
    expect(withBars(atPoints([0, 595]))).toEqual([
      {
        path: 'section.bars[0].layout',
        code: 'outside',
        message: 'the bar at (0, 595) leaves the outline',
        found: '5 mm outside',
        allowed: 'wholly inside the outline',
      },
    ])
  })

  it('one issue for a whole ring that is too large', () => {
    const ring = bars({ kind: 'ring', centre: [0, 0], diameter: 1300, count: 20 })
    expect(withBars(ring)).toMatchObject([
      { path: 'section.bars[0].layout', code: 'outside', message: 'the bar at (0, 650) leaves the outline' },
    ])
  })

  it('a bar that reaches into a void', () => {
    const issues = readSection((section) => {
      section.voids = [hole({})]
      section.bars = [atPoints([0, 160], [0, -159])]
    })
    expect(issues).toEqual([
      {
        path: 'section.bars[0].layout',
        code: 'bar-in-void',
        message: 'the bar at (0, -159) reaches into void 1',
        found: '1 mm inside',
        allowed: 'bars wholly in concrete',
      },
    ])
  })

  it('two bars whose circles overlap, in one group or two; touching bars are sound', () => {
    expect(withBars(atPoints([0, 0], [20, 0]))).toEqual([])
    expect(withBars(atPoints([0, 0]), atPoints([15, 0]))).toEqual([
      {
        path: 'section.bars[1].layout',
        code: 'bars-overlap',
        message: 'the bar at (15, 0) overlaps the one at (0, 0)',
        found: '5 mm overlap',
        allowed: 'bars apart from one another',
      },
    ])
    const line = bars({ kind: 'line', from: [-100, 0], to: [100, 0], count: 12 })
    expect(withBars(line)).toMatchObject([{ path: 'section.bars[0].layout', code: 'bars-overlap' }])
  })

  it('more bars in all than any column has, at once', () => {
    const crowd = bars({ kind: 'ring', centre: [0, 0], diameter: 1000, count: 2000 })
    const before = performance.now()
    expect(withBars(...Array.from({ length: 500 }, () => crowd))).toEqual([
      {
        path: 'section.bars',
        code: 'too-large',
        message: 'are too many bars',
        found: '1000000 bars',
        allowed: 'at most 2000 bars',
      },
    ])
    expect(performance.now() - before).toBeLessThan(1000)
  })

  it('a steel that is not defined', () => {
    expect(withBars({ ...atPoints([0, 0]), steel: 'M' })).toMatchObject([
      { path: 'section.bars[0].steel', code: 'unknown-steel', found: '"M"', allowed: '"L", "T"' },
    ])
  })

  it('all that is wrong comes together, but inside and outside mean nothing without a sound outline', () => {
    const issues = readSection((section) => {
      section.outline = { kind: 'rectangle', width: 100, depth: 100, chamfer: 60 }
      section.spirals = [spiral({ pitch: 10, steel: 'X' })]
    })
    expect(issues.map((issue) => issue.path)).toEqual([
      'section.outline.chamfer',
      'section.spirals[0].pitch',
      'section.spirals[0].steel',
    ])
  })
})
