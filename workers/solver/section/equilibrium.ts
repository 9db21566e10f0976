/**
 * Axial equilibrium at a given curvature: the axial strain eps0 with N(eps0, kappa) = load on the branch that rises,
 * dN/d eps0 > 0. Newton's method inside a bracket that closes on the rising branch.
 */
import { findRoot } from '../numeric/roots.ts'
import { axialForce, axialTangent, computeResultants, resultantCount } from './resultants.ts'
import type { SectionModel } from './sectionModel.ts'

export interface EquilibriumSolver {
  /** Resultants (see resultants.ts) at the latest solution. */
  readonly resultants: Float64Array
  /** Stopping test: |N - load| <= tolerance, N. */
  readonly tolerance: number
  /** Iterations of the latest call. */
  readonly iterations: number
  /** Iterations of all calls. */
  readonly total: number
  /**
   * Axial strain at the curvature kappa (1/mm), or NaN where the rising branch has no solution within `reach` of the
   * start. Evaluates the resultants at the solution.
   */
  solve(kappa: number, start: number, reach: number): number
}

/** Of f'co Ag: a tenth of the stopping test of the contract (1e-6); moments move by less than 1e-5 with it. */
const relativeTolerance = 1e-7
const mostIterations = 80

export function createEquilibriumSolver(
  model: SectionModel,
  load: number,
  concreteStrength: number,
): EquilibriumSolver {
  const resultants = new Float64Array(resultantCount)
  const tolerance = relativeTolerance * concreteStrength * model.grossArea
  let iterations = 0
  let total = 0

  function solve(kappa: number, start: number, reach: number): number {
    // Everything at or below `low` lies under the root on the rising branch, everything at or above `high` beyond it.
    let low = -Infinity
    let high = Infinity
    let eps = start
    iterations = 0
    while (iterations < mostIterations) {
      computeResultants(model, eps, kappa, resultants)
      iterations += 1
      total += 1
      const residual = resultants[axialForce] - load
      const tangent = resultants[axialTangent]
      if (Math.abs(residual) <= tolerance && tangent > 0) return eps
      const rising = tangent > 0
      if (rising && residual < 0) low = eps
      else high = eps
      let next = rising ? eps - residual / tangent : Number.NaN
      if (!(next > low && next < high)) {
        if (low > -Infinity && high < Infinity) next = (low + high) / 2
        else if (high < Infinity) next = high - step(high)
        else next = low + step(low)
      } else if (Math.abs(next - eps) > reach) {
        next = eps + Math.sign(next - eps) * reach
      }
      if (Math.abs(next - start) > 4 * reach) return Number.NaN
      // The bracket has closed on a peak of N below the load.
      if (next === eps || high - low < 1e-15) return Number.NaN
      eps = next
    }
    return Number.NaN

    /** Walks out from a start beyond the peak of N, in growing steps. */
    function step(from: number): number {
      return Math.max(reach / 16, Math.abs(from - start))
    }
  }

  return {
    resultants,
    tolerance,
    get iterations() {
      return iterations
    },
    get total() {
      return total
    },
    solve,
  }
}

/** Strains between which the root at zero curvature is sought. */
export interface StartRange {
  /** Tension end, negative or 0. */
  least: number
  /** Compression end. */
  greatest: number
}

const scanSteps = 400

/**
 * Axial strain at zero curvature: the root met first when the strain moves from 0 towards the load. NaN: there is none
 * between the ends of the range, not even where N comes nearest to the load between two steps.
 */
export function findStart(
  model: SectionModel,
  load: number,
  range: StartRange,
  solver: EquilibriumSolver,
): number {
  if (load === 0) {
    computeResultants(model, 0, 0, solver.resultants)
    return 0
  }
  const end = load > 0 ? range.greatest : range.least
  if (end === 0) return Number.NaN
  const towards = Math.sign(load)
  /** Negative before the load is reached. */
  const lack = (eps: number) => {
    computeResultants(model, eps, 0, solver.resultants)
    return towards * (solver.resultants[axialForce] - load)
  }
  let before = 0
  let at = 0
  let lackBefore = -Infinity
  let lackAt = -Math.abs(load)
  for (let i = 1; i <= scanSteps; i++) {
    // Steps grow with the strain: the first ones have to resolve yielding bars.
    const next = end * (i / scanSteps) ** 1.5
    const lackNext = lack(next)
    if (lackNext >= 0) return closeIn(at, next)
    if (lackAt > lackBefore && lackAt > lackNext) {
      const peak = findPeak(before, next, lack)
      if (lack(peak) >= 0) return closeIn(at < peak === towards > 0 ? at : before, peak)
    }
    before = at
    at = next
    lackBefore = lackAt
    lackAt = lackNext
  }
  return Number.NaN

  /** lack(low) < 0 <= lack(high). */
  function closeIn(low: number, high: number): number {
    const root = findRoot(lack, low, high, 0)
    lack(root)
    return root
  }
}

/** Golden-section search for the greatest value between a and b. */
function findPeak(a: number, b: number, f: (x: number) => number): number {
  const golden = (Math.sqrt(5) - 1) / 2
  let low = a
  let high = b
  let left = high - golden * (high - low)
  let right = low + golden * (high - low)
  let fLeft = f(left)
  let fRight = f(right)
  for (let i = 0; i < 60; i++) {
    if (fLeft > fRight) {
      high = right
      right = left
      fRight = fLeft
      left = high - golden * (high - low)
      fLeft = f(left)
    } else {
      low = left
      left = right
      fLeft = fRight
      right = low + golden * (high - low)
      fRight = f(right)
    }
  }
  return fLeft > fRight ? left : right
}
