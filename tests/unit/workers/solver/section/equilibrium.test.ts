import { describe, expect, it } from 'vitest'
import { computeOutlineArea } from '#shared/geometry/outline.ts'
import { createEquilibriumSolver, findStart } from '#workers/solver/section/equilibrium.ts'
import {
  axialForce,
  axialTangent,
  computeResultants,
  resultantCount,
} from '#workers/solver/section/resultants.ts'
import { createSectionModel } from '#workers/solver/section/sectionModel.ts'
import { createCircleDocument } from '../../../../helpers/sampleSections.ts'
import { readSound } from '../../../../helpers/solve.ts'

const document = readSound(createCircleDocument())
const grossArea = computeOutlineArea(document.section.outline)
const model = createSectionModel(document, grossArea)
const strength = document.materials.concrete.strength
const range = { least: -0.06, greatest: 0.02 }

function forceAt(eps: number, kappa = 0): number {
  const out = new Float64Array(resultantCount)
  computeResultants(model, eps, kappa, out)
  return out[axialForce]
}

function startAt(load: number): number {
  return findStart(model, load, range, createEquilibriumSolver(model, load, strength))
}

/** The first local maximum of N over a uniform strain, to 1e-9 of strain. */
function locatePeak(): { strain: number; force: number } {
  let strain = 0
  while (forceAt(strain + 1e-7) > forceAt(strain)) strain += 1e-7
  return { strain, force: forceAt(strain) }
}

describe('the start at zero curvature', () => {
  it('meets the load in compression and in tension', () => {
    for (const load of [1, 1e3, 1e6, 1e7, -1e3, -1e6, -3e6]) {
      const eps = startAt(load)
      expect(Math.sign(eps)).toBe(Math.sign(load))
      expect(Math.abs(forceAt(eps) - load)).toBeLessThanOrEqual(1e-8 * strength * grossArea)
    }
  })

  it('is zero strain without load', () => {
    expect(startAt(0)).toBe(0)
  })

  it('is not found for loads that the section cannot carry', () => {
    for (const load of [1e9, 1e15, 1e300, -1e9, -1e300]) expect(startAt(load)).toBeNaN()
  })

  it('is found right under the peak of N, where a scan would step over it, and not right above', () => {
    const peak = locatePeak()
    const eps = startAt(peak.force * (1 - 1e-9))
    expect(Math.abs(eps - peak.strain)).toBeLessThan(1e-5)
    expect(eps).toBeLessThan(peak.strain)
    const above = startAt(peak.force * (1 + 1e-6))
    // A later, higher part of the curve may still carry it, but nothing near this peak.
    expect(Number.isNaN(above) || above > peak.strain + 1e-4).toBe(true)
  })

  it('looks no farther than the ends of its range', () => {
    const solver = createEquilibriumSolver(model, -1e3, strength)
    expect(findStart(model, -1e3, { least: 0, greatest: 0.02 }, solver)).toBeNaN()
    expect(findStart(model, -3e6, { least: -1e-3, greatest: 0.02 }, solver)).toBeNaN()
  })
})

describe('equilibrium at a curvature', () => {
  const load = 3e6

  it('meets its stopping test on the rising branch from starts on either side', () => {
    for (const kappa of [1e-7, 2e-6, 1e-5, 3e-5]) {
      const solver = createEquilibriumSolver(model, load, strength)
      const roots = [-3e-4, 0, 3e-4].map((offset) => solver.solve(kappa, 2e-4 + offset - kappa * 100, 2e-3))
      for (const root of roots) {
        expect(Math.abs(forceAt(root, kappa) - load)).toBeLessThanOrEqual(solver.tolerance)
        expect(root).toBeCloseTo(roots[0], 9)
      }
      expect(solver.resultants[axialTangent]).toBeGreaterThan(0)
      expect(solver.iterations).toBeLessThan(15)
    }
  })

  it('is not found outside its reach, nor for a load above the greatest force', () => {
    expect(createEquilibriumSolver(model, load, strength).solve(1e-6, 0.01, 1e-5)).toBeNaN()
    const solver = createEquilibriumSolver(model, 1e9, strength)
    expect(solver.solve(1e-6, 1e-3, 1e-2)).toBeNaN()
    expect(solver.iterations).toBeLessThanOrEqual(80)
  })

  it('counts all its iterations', () => {
    const solver = createEquilibriumSolver(model, load, strength)
    solver.solve(1e-6, 2e-4, 1e-3)
    const first = solver.iterations
    solver.solve(2e-6, 2e-4, 1e-3)
    expect(solver.total).toBe(first + solver.iterations)
  })
})
