/**
 * Plausible and less plausible sections under random loads, for properties and soak of the solver: no or up to seven spirals,
 * with or without bars, every outline and steel law, voids, loads of -0.1 to 0.7 f'c Ag (and none), any angle.
 */
import fc from 'fast-check'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

interface SpiralDraw {
  size: number
  along: number
  across: number
  pitch: number
  form: string
  bar: number
  count: number
}

const spiralDraw: fc.Arbitrary<SpiralDraw> = fc.record({
  size: between(0.25, 0.9),
  along: between(-1, 1),
  across: between(-1, 1),
  pitch: between(40, 200),
  form: fc.constantFrom('spiral', 'hoop'),
  bar: fc.constantFrom(10, 13, 16, 20),
  count: fc.integer({ min: 3, max: 20 }),
})

const longitudinal = fc.oneof(
  fc.record({
    law: fc.constant('menegotto-pinto'),
    yieldStrength: between(250, 650),
    hardeningRatio: fc.oneof(fc.constant(0), between(0, 0.03)),
    strainAtMaximumStress: fc.constantFrom(0.06, 0.09, 0.12),
    r0: fc.constantFrom(20, 20, 8),
    a1: fc.constant(6),
  }),
  fc.record({
    law: fc.constant('plateau-hardening'),
    yieldStrength: between(250, 500),
    tensileStrength: between(520, 800),
    hardeningStrain: between(0.004, 0.02),
    hardeningModulus: between(1500, 9000),
    strainAtMaximumStress: fc.constantFrom(0.06, 0.09, 0.12),
  }),
  fc.record(
    {
      law: fc.constant('elastic-plastic'),
      yieldStrength: between(250, 650),
      strainAtMaximumStress: fc.constant(0.1),
    },
    { requiredKeys: ['law', 'yieldStrength'] },
  ),
)

const draw = fc.record({
  kind: fc.constantFrom('circle', 'rectangle', 'oblong', 'polygon'),
  width: between(300, 2500),
  ratio: between(0.5, 2),
  chamfer: fc.oneof(fc.constant(0), between(0.02, 0.2)),
  notch: between(0.2, 1),
  spirals: fc.array(spiralDraw, { maxLength: 7 }),
  bars: fc.constantFrom('with spirals', 'with spirals', 'with spirals', 'one ring', 'none'),
  barDiameter: fc.constantFrom(13, 16, 25, 36),
  hole: fc.option(fc.record({ size: between(0.05, 0.6), lining: fc.boolean() }), { freq: 5 }),
  strength: between(18, 80),
  spalling: between(0.0051, 0.008),
  steel: longitudinal,
  hoopYield: between(250, 900),
  confinement: fc.constantFrom('mander', 'mander', 'mander', 'none'),
  overlap: fc.constantFrom('sum', 'largest'),
  endAt: fc.constantFrom('first-limit', 'first-limit', 'moment-drop-20'),
  load: fc.oneof({ weight: 9, arbitrary: between(-0.1, 0.7) }, { weight: 1, arbitrary: fc.constant(0) }),
  angle: fc.oneof(between(0, 360), fc.constantFrom(0, 45, 90)),
  idealisation: fc.constantFrom('first-yield-nominal', 'equal-area-beyond-yield', 'equal-area-from-zero'),
})
type Draw = typeof draw extends fc.Arbitrary<infer T> ? T : never

function toOutline({ kind, width, ratio, chamfer, notch }: Draw) {
  const depth = width * ratio
  switch (kind) {
    case 'circle':
      return { kind, diameter: width }
    case 'rectangle':
      return { kind, width, depth, chamfer: chamfer * Math.min(width, depth) }
    case 'oblong':
      return { kind, width, depth }
    default: {
      const [w, d] = [width / 2, depth / 2]
      const points = [
        [-w, -d],
        [w, -d],
        [w, d],
        [0, d * notch],
        [-w, d],
      ]
      return { kind, points }
    }
  }
}

/** The drawn section; `shrink` pulls spirals towards the middle and makes them smaller, until they fit. */
function toInput(drawn: Draw, shrink: number, withBars: boolean, withHole: boolean) {
  const { width, ratio, spirals, hole } = drawn
  const depth = drawn.kind === 'circle' ? width : width * ratio
  const least = Math.min(width, depth)
  const placed = spirals.map((one, i) => {
    const diameter = Math.max(60, one.size * shrink * (least - 60))
    return {
      id: `S${i + 1}`,
      centre: [
        (shrink * one.along * (width - diameter - 60)) / 2,
        (shrink * one.across * (depth - diameter - 60)) / 2,
      ],
      diameter,
      barDiameter: one.bar,
      pitch: one.pitch,
      form: one.form,
      steel: 'T',
    }
  })
  const ringOf = (centre: number[], diameter: number, count: number) => ({
    layout: { kind: 'ring', centre, diameter, count, startAngle: 7 },
    barDiameter: drawn.barDiameter,
    steel: 'L',
  })
  const rings =
    drawn.bars === 'one ring'
      ? [ringOf([0, 0], 0.55 * least, 10)]
      : placed.map(({ centre, diameter }, i) => ringOf(centre, Math.max(40, diameter - 60), spirals[i].count))
  return {
    section: {
      outline: toOutline(drawn),
      spirals: placed,
      bars: withBars && drawn.bars !== 'none' ? rings : [],
      voids:
        hole && withHole
          ? [{ kind: 'circle', centre: [0, 0], diameter: hole.size * least, lining: hole.lining }]
          : [],
    },
    materials: {
      concrete: {
        strength: drawn.strength,
        spallingStrain: drawn.spalling,
        modulus: Math.max(5000 * Math.sqrt(drawn.strength), 600 * drawn.strength),
      },
      steels: {
        L: drawn.steel,
        T: { law: 'elastic-plastic', yieldStrength: drawn.hoopYield, strainAtMaximumStress: 0.1 },
      },
      confinement: { strength: drawn.confinement, overlap: drawn.overlap },
    },
    analysis: {
      kind: 'moment-curvature',
      axialLoad: 0,
      angle: drawn.angle,
      endAt: drawn.endAt,
      idealisation: drawn.idealisation,
      points: 100,
    },
  }
}

function toDocument(drawn: Draw): AnalysisDocument | null {
  for (const [withBars, withHole] of [
    [true, true],
    [true, false],
    [false, false],
  ]) {
    for (const shrink of [1, 0.7, 0.4]) {
      const read = readDocument(toInput(drawn, shrink, withBars, withHole))
      if (read.status === 'bad') continue
      const { analysis, materials, section } = read.document
      analysis.axialLoad = drawn.load * materials.concrete.strength * computeOutlineArea(section.outline)
      return read.document
    }
  }
  return null
}

export const sectionArbitrary: fc.Arbitrary<AnalysisDocument> = draw
  .map(toDocument)
  .filter((document) => document !== null)
