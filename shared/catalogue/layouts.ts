/**
 * Layouts a section starts from. Each can be built: bars lie against the inside of their own spiral, and no bar stands in
 * the way of a wire that it does not belong to. Lengths in mm, loads in N, strengths in MPa; all dimensions are our own.
 */
import type { AnalysisDocumentInput } from '../document/schema.ts'

export interface Layout {
  id: string
  title: string
  description: string
  create(): AnalysisDocumentInput
}

type SectionInput = AnalysisDocumentInput['section']
type SpiralInput = NonNullable<SectionInput['spirals']>[number]
type BarGroupInput = NonNullable<SectionInput['bars']>[number]

/** Bars of grade 420 with expected strengths; A706 Grade 60 is of this kind (ASTM A706, from memory). */
export function createMaterials(
  concreteStrength: number,
  specified: number,
): AnalysisDocumentInput['materials'] {
  return {
    strengthBasis: 'expected',
    concrete: { strength: concreteStrength, specified: { strength: specified } },
    steels: {
      L: {
        law: 'menegotto-pinto',
        yieldStrength: 460,
        hardeningRatio: 0.008,
        strainAtMaximumStress: 0.12,
        limitStrain: 0.09,
        specified: { yieldStrength: 420 },
      },
      T: {
        law: 'elastic-plastic',
        yieldStrength: 460,
        strainAtMaximumStress: 0.1,
        specified: { yieldStrength: 420 },
      },
    },
  }
}

/** A ring of bars against the inside of a spiral. */
export function createInnerRing(
  spiral: SpiralInput,
  count: number,
  barDiameter: number,
  startAngle: number,
): BarGroupInput {
  return {
    layout: {
      kind: 'ring',
      centre: [...spiral.centre],
      diameter: spiral.diameter - spiral.barDiameter - barDiameter,
      count,
      startAngle,
    },
    barDiameter,
    steel: 'L',
  }
}

/** One spiral in a circle of the given diameter with 50 mm cover. */
export function createOneSpiral(diameter: number, pitch: number): SectionInput {
  const spiral: SpiralInput = {
    id: 'S1',
    centre: [0, 0],
    diameter: diameter - 2 * 50 - 16,
    barDiameter: 16,
    pitch,
    form: 'spiral',
    steel: 'T',
  }
  return {
    outline: { kind: 'circle', diameter },
    spirals: [spiral],
    bars: [createInnerRing(spiral, 24, 32, 90)],
  }
}

/** Two spirals 0.6 diameters apart in an oblong; the bars of both rings pass one another in the interlock. */
export function createTwoInterlocking(pitch: number): SectionInput {
  const spirals = ([-1, 1] as const).map((side): SpiralInput => ({
    id: side < 0 ? 'W' : 'E',
    centre: [side * 325, 0],
    diameter: 1084,
    barDiameter: 16,
    pitch,
    form: 'spiral',
    steel: 'T',
  }))
  return {
    outline: { kind: 'oblong', width: 1850, depth: 1200 },
    spirals,
    bars: spirals.map((spiral) => createInnerRing(spiral, 24, 32, 0)),
  }
}

/**
 * A large centre spiral and four corner spirals in a 1.5 m square. The start angles keep the bars of each ring clear of
 * the wires of the others: bars of the centre ring stand 7.5 and 22.5 degrees off the diagonals.
 */
export function createFiveSpirals(pitch: number): SectionInput {
  const centre: SpiralInput = {
    id: 'C',
    centre: [0, 0],
    diameter: 1380,
    barDiameter: 20,
    pitch,
    form: 'spiral',
    steel: 'T',
  }
  const corners = (
    [
      [1, 1],
      [-1, 1],
      [-1, -1],
      [1, -1],
    ] as const
  ).map(([x, y], i): SpiralInput => ({
    id: `K${i + 1}`,
    centre: [485 * x, 485 * y],
    diameter: 400,
    barDiameter: 12,
    pitch,
    form: 'spiral',
    steel: 'T',
  }))
  return {
    outline: { kind: 'rectangle', width: 1500, depth: 1500, chamfer: 60 },
    spirals: [centre, ...corners],
    bars: [
      createInnerRing(centre, 24, 32, 97.5),
      ...corners.map((corner) => createInnerRing(corner, 8, 29, 22.5)),
    ],
  }
}

export const layouts: Layout[] = [
  {
    id: 'one-spiral',
    title: 'One spiral',
    description: 'A 1.2 m circle with one spiral and one ring of bars.',
    create: () => ({
      format: 'girdwell-analysis/1',
      section: createOneSpiral(1200, 70),
      materials: createMaterials(40, 35),
      cases: [
        { name: 'permanent load', axialLoad: 5_400_000 },
        { name: 'greatest load', axialLoad: 6_700_000 },
      ],
      analysis: { kind: 'moment-curvature', case: 'permanent load' },
    }),
  },
  {
    id: 'two-interlocking',
    title: 'Two interlocking spirals',
    description: 'An oblong of 1.85 by 1.2 m with two spirals whose centres are 0.6 diameters apart.',
    create: () => ({
      format: 'girdwell-analysis/1',
      section: createTwoInterlocking(70),
      materials: createMaterials(40, 35),
      cases: [
        { name: 'permanent load, weak axis', axialLoad: 9_000_000 },
        { name: 'permanent load, strong axis', axialLoad: 9_000_000, angle: 90 },
      ],
      analysis: { kind: 'moment-curvature', case: 'permanent load, weak axis' },
    }),
  },
  {
    id: 'five-spirals',
    title: 'Centre and four corner spirals',
    description: 'A 1.5 m square with a large spiral in the middle and a small one in each corner.',
    create: () => ({
      format: 'girdwell-analysis/1',
      section: createFiveSpirals(80),
      materials: createMaterials(45, 38),
      cases: [
        { name: 'permanent load', axialLoad: 12_000_000 },
        { name: 'permanent load, diagonal', axialLoad: 12_000_000, angle: 45 },
      ],
      analysis: { kind: 'moment-curvature', case: 'permanent load' },
    }),
  },
]
