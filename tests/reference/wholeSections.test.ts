/**
 * Two whole-section benchmarks computed by an independent strip integration (6000 strips; 24000 change the sixth digit) with
 * the laws of Mander, Priestley & Park 1988 and a power-hardening steel with exponent 2. Values have six digits.
 */
import { describe, expect, it } from 'vitest'
import { expectReference } from '../helpers/referenceTable.ts'
import { findLimitState, interpolateMoment, readSound, solve } from '../helpers/solve.ts'
import { createSectionModel } from '#workers/solver/section/sectionModel.ts'
import { computeResultants, axialForce, resultantCount } from '#workers/solver/section/resultants.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'

/** Esh for which the exponent p = Esh (epsSu - epsSh) / (fu - fy) is 2. */
const hardeningModulus = (2 * (620 - 420)) / (0.12 - 0.015)
const materials = {
  concrete: { strength: 35, peakStrain: 0.002, spallingStrain: 0.006, modulus: 29580.3989 },
  steels: {
    L: {
      law: 'plateau-hardening',
      yieldStrength: 420,
      tensileStrength: 620,
      hardeningStrain: 0.015,
      hardeningModulus,
      strainAtMaximumStress: 0.12,
    },
    T: { law: 'elastic-plastic', yieldStrength: 420, strainAtMaximumStress: 0.12 },
  },
}
const spiral = (id: string, x: number) => ({
  id,
  centre: [x, 0],
  diameter: 1084,
  barDiameter: 16,
  barArea: 201.0619,
  pitch: 80,
  form: 'spiral',
  steel: 'T',
})
const ring = (x: number, startAngle: number) => ({
  layout: { kind: 'ring', centre: [x, 0], diameter: 1036, count: 24, startAngle },
  barDiameter: 32,
  barArea: 804.2477,
  steel: 'L',
})
const circle = {
  section: {
    outline: { kind: 'circle', diameter: 1200 },
    spirals: [spiral('S1', 0)],
    bars: [ring(0, 90)],
  },
  materials,
  analysis: { kind: 'moment-curvature', axialLoad: 3958406.7 },
}
const oblong = (angle: number, axialLoad = 6690086.7, overlap = 'sum') => ({
  section: {
    outline: { kind: 'oblong', width: 1850.4, depth: 1200 },
    spirals: [spiral('W', -325.2), spiral('E', 325.2)],
    bars: [ring(-325.2, 0), ring(325.2, 0)],
  },
  materials: { ...materials, confinement: { overlap } },
  analysis: { kind: 'moment-curvature', axialLoad, angle },
})

const tolerance = 3e-4
const reason = 'six digits on both sides'
/** The contract allows 0.2 % between rows. */
const betweenRows = 1e-3

/** id, got, wanted; curvatures in 1/mm, moments in kN·m. */
function expectAll(id: string, rows: [quantity: string, got: number | null, wanted: number][]) {
  for (const [quantity, got, wanted] of rows) {
    expectReference({
      id: `${id} ${quantity}`,
      source: 'independent strip integration, 6000 strips',
      inputs: id,
      got: got ?? Number.NaN,
      wanted,
      tolerance: quantity.startsWith('moment at') ? betweenRows : tolerance,
      reason: quantity.startsWith('moment at') ? 'straight lines between rows' : reason,
    })
  }
}

describe('B1, circle with one spiral', () => {
  it('meets first yield, nominal and ultimate state and the moments between', () => {
    const solution = solve(circle)
    const { idealised } = solution
    const nominal = findLimitState(solution, 'concrete-0.004')
    expectAll('B1', [
      ['confined strength', solution.spirals[0].confinedStrength, 46.84918],
      ['ultimate strain', solution.spirals[0].ultimateStrain, 0.01796777],
      ['first yield curvature', idealised.firstYieldCurvature, 3.146605e-6],
      ['first yield moment', idealised.firstYieldMoment! / 1e6, 3968.31],
      ['nominal curvature', nominal.curvature, 1.186949e-5],
      ['nominal moment', nominal.moment / 1e6, 5128.85],
      ['yield curvature', idealised.yieldCurvature, 4.066835e-6],
      ['ultimate curvature', idealised.ultimateCurvature, 6.486669e-5],
      ['ultimate moment', idealised.ultimateMoment! / 1e6, 5430.38],
      ['ductility', idealised.ductility, 15.95],
      ['neutral axis at ultimate', solution.points.neutralAxisDepth.at(-1)!, 335.0],
      ...(
        [
          [2e-6, 2914.86],
          [5e-6, 4667.14],
          [1e-5, 5095.03],
          [2e-5, 5062.24],
          [3e-5, 5106.99],
        ] as const
      ).map(([curvature, wanted]): [string, number, number] => [
        `moment at ${curvature}`,
        interpolateMoment(solution, curvature) / 1e6,
        wanted,
      ]),
    ])
  })

  it('has its greatest concentric force at the published strain', () => {
    const document = readSound(circle)
    const model = createSectionModel(document, computeOutlineArea(document.section.outline))
    const out = new Float64Array(resultantCount)
    let greatest = 0
    let at = 0
    for (let strain = 0.002; strain < 0.008; strain += 1e-6) {
      computeResultants(model, strain, 0, out)
      if (out[axialForce] > greatest) {
        greatest = out[axialForce]
        at = strain
      }
    }
    expectAll('B1', [['concentric peak', greatest / 1e3, 54788.75]])
    expect(at).toBeCloseTo(0.004, 4)
  })
})

describe('B2, oblong with two interlocking spirals', () => {
  it('bends about the weak axis', () => {
    const solution = solve(oblong(0))
    const nominal = findLimitState(solution, 'concrete-0.004')
    expectAll('B2 weak', [
      ['effectiveness', solution.spirals[0].effectiveness, 0.997425],
      ['confining stress', solution.spirals[0].confiningStress, 1.942541],
      ['confined strength', solution.spirals[0].confinedStrength, 46.91524],
      ['lens strength', solution.zones.find((zone) => zone.spirals.length === 2)!.strength, 56.54743],
      ['lens area', solution.zones.find((zone) => zone.spirals.length === 2)!.area, 262798.5],
      ['first yield curvature', solution.idealised.firstYieldCurvature, 3.114958e-6],
      ['first yield moment', solution.idealised.firstYieldMoment! / 1e6, 7678.31],
      ['nominal curvature', nominal.curvature, 1.20755e-5],
      ['nominal moment', nominal.moment / 1e6, 9933.55],
      ['yield curvature', solution.idealised.yieldCurvature, 4.029865e-6],
      ['ultimate curvature', solution.idealised.ultimateCurvature, 6.484171e-5],
      ['ultimate moment', solution.idealised.ultimateMoment! / 1e6, 10464.33],
    ])
  })

  it('bends about the strong axis', () => {
    const solution = solve(oblong(90))
    const nominal = solution.limitStates.find(
      (state) => state.kind === 'concrete-0.004' || state.kind === 'bar-0.015',
    )!
    expectAll('B2 strong', [
      ['first yield curvature', solution.idealised.firstYieldCurvature, 1.960356e-6],
      ['first yield moment', solution.idealised.firstYieldMoment! / 1e6, 10021.35],
      ['nominal curvature', nominal.curvature, 7.009461e-6],
      ['nominal moment', nominal.moment / 1e6, 14529.37],
      ['yield curvature', solution.idealised.yieldCurvature, 2.842206e-6],
      ['ultimate curvature', solution.idealised.ultimateCurvature, 3.684759e-5],
      ['ultimate moment', solution.idealised.ultimateMoment! / 1e6, 15273.08],
      ['moment at 2e-6', interpolateMoment(solution, 2e-6) / 1e6, 10149.68],
      ['moment at 5e-6', interpolateMoment(solution, 5e-6) / 1e6, 13939.74],
      ['moment at 1e-5', interpolateMoment(solution, 1e-5) / 1e6, 14710.13],
      ['moment at 2e-5', interpolateMoment(solution, 2e-5) / 1e6, 14797.94],
    ])
  })

  it('shows what the overlap rule changes', () => {
    const load = 0.4 * 35 * 1911453.4
    const largest = solve(oblong(0, 6690086.7, 'largest'))
    const heavySum = solve(oblong(0, load))
    const heavyLargest = solve(oblong(0, load, 'largest'))
    expectAll('B2 weak, overlap', [
      ['largest: nominal moment', findLimitState(largest, 'concrete-0.004').moment / 1e6, 9933.11],
      ['largest: ultimate moment', largest.idealised.ultimateMoment! / 1e6, 10445.36],
      ['largest: ultimate curvature', largest.idealised.ultimateCurvature, 6.459318e-5],
      ['0.4 f’c Ag, sum: ultimate moment', heavySum.idealised.ultimateMoment! / 1e6, 13224.32],
      ['0.4 f’c Ag, sum: ultimate curvature', heavySum.idealised.ultimateCurvature, 3.723911e-5],
      ['0.4 f’c Ag, largest: ultimate moment', heavyLargest.idealised.ultimateMoment! / 1e6, 13075.7],
      ['0.4 f’c Ag, largest: ultimate curvature', heavyLargest.idealised.ultimateCurvature, 3.666553e-5],
    ])
  })
})
