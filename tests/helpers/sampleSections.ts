/** Plain invented sections for tests of the solver; each call anew, so that a test may change what it gets. */

interface SampleChange {
  section?: Record<string, unknown>
  concrete?: Record<string, unknown>
  steels?: Record<string, unknown>
  confinement?: Record<string, unknown>
  analysis?: Record<string, unknown>
}

export const longitudinal = {
  law: 'menegotto-pinto',
  yieldStrength: 460,
  hardeningRatio: 0.008,
  strainAtMaximumStress: 0.09,
}
export const transverse = { law: 'elastic-plastic', yieldStrength: 420, strainAtMaximumStress: 0.1 }
export const plateau = {
  law: 'plateau-hardening',
  yieldStrength: 420,
  tensileStrength: 620,
  hardeningStrain: 0.012,
  hardeningModulus: 4500,
  strainAtMaximumStress: 0.1,
}

export function createSpiral(id: string, centre: [number, number], diameter: number, pitch = 80) {
  return { id, centre, diameter, barDiameter: 14, pitch, form: 'spiral', steel: 'T' }
}

export function createRing(centre: [number, number], diameter: number, count = 12, startAngle = 90) {
  return {
    layout: { kind: 'ring', centre, diameter, count, startAngle },
    barDiameter: 25,
    steel: 'L',
  }
}

/** Circle of 1000 mm with one spiral of 880 mm, sixteen bars and a tenth of the concrete's strength as load. */
export function createCircleDocument({
  section,
  concrete,
  steels,
  confinement,
  analysis,
}: SampleChange = {}) {
  return {
    section: {
      outline: { kind: 'circle', diameter: 1000 },
      spirals: [createSpiral('S1', [0, 0], 880)],
      bars: [createRing([0, 0], 840, 16)],
      ...section,
    },
    materials: {
      concrete: { strength: 32, ...concrete },
      steels: { L: longitudinal, T: transverse, ...steels },
      confinement: { ...confinement },
    },
    analysis: { kind: 'moment-curvature', axialLoad: 2.5e6, ...analysis },
  }
}

/** Square of 1200 mm with a large spiral and four small ones that cross it, as a plain and slightly lopsided section. */
export function createCornerSpiralsDocument(change: SampleChange = {}) {
  const corners: [number, number][] = [
    [380, 380],
    [-380, 380],
    [-380, -380],
    [380, -380],
  ]
  return createCircleDocument({
    ...change,
    section: {
      outline: { kind: 'rectangle', width: 1200, depth: 1200, chamfer: 40 },
      spirals: [
        createSpiral('C', [0, 0], 1060),
        ...corners.map((centre, i) => createSpiral(`K${i + 1}`, centre, 320, 90)),
      ],
      bars: [createRing([0, 0], 1020, 14, 77), ...corners.map((centre) => createRing(centre, 270, 4, 45))],
      ...change.section,
    },
    analysis: { axialLoad: 5e6, ...change.analysis },
  })
}
