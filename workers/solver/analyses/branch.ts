/**
 * The connected branch of equilibrium, walked from zero curvature: states at growing curvature, dense enough to be
 * interpolated, from which any state between them is found in one or two iterations.
 */
import type { EquilibriumSolver } from '../section/equilibrium.ts'
import { axialTangent, bendingTangent, couplingTangent, moment } from '../section/resultants.ts'

export interface BranchState {
  kappa: number
  eps0: number
  /** d eps0 / d kappa along the branch. */
  strainSlope: number
  moment: number
  /** dM / d kappa along the branch. */
  momentSlope: number
  /** N */
  residual: number
  iterations: number
}

/** The state at the solver's latest solution. */
export function readState(solver: EquilibriumSolver, load: number, kappa: number, eps0: number): BranchState {
  const { resultants, iterations } = solver
  const Na = resultants[axialTangent]
  const Nk = resultants[couplingTangent]
  const strainSlope = Na > 0 ? -Nk / Na : 0
  return {
    kappa,
    eps0,
    strainSlope,
    moment: resultants[moment],
    momentSlope: resultants[bendingTangent] + Nk * strainSlope,
    residual: Math.abs(resultants[0] - load),
    iterations,
  }
}

/** Cubic Hermite interpolation of eps0 between two states. */
export function interpolateStrain(from: BranchState, to: BranchState, kappa: number): number {
  const h = to.kappa - from.kappa
  if (h === 0) return from.eps0
  const t = (kappa - from.kappa) / h
  const rise = to.eps0 - from.eps0
  const m0 = from.strainSlope * h
  const m1 = to.strainSlope * h
  return from.eps0 + t * (m0 + t * (3 * rise - 2 * m0 - m1 + t * (m0 + m1 - 2 * rise)))
}

/**
 * How far (strain) a solution may lie from where it is expected. Before a fold the strain runs away like a square root,
 * so the reach does not vanish with the step.
 */
function computeReach(deltaKappa: number, depth: number): number {
  return Math.max(1e-4, 0.5 * Math.abs(deltaKappa) * depth)
}

/**
 * The state at kappa on the branch after `from`; null where the branch has none near. Where the state before `from` is
 * known, the change of the slope between them carries the start of Newton's method along.
 */
export function continueFrom(
  solver: EquilibriumSolver,
  load: number,
  depth: number,
  from: BranchState,
  kappa: number,
  before?: BranchState,
): BranchState | null {
  const delta = kappa - from.kappa
  const bend = before ? (from.strainSlope - before.strainSlope) / (from.kappa - before.kappa) : 0
  const start = from.eps0 + (from.strainSlope + 0.5 * bend * delta) * delta
  const eps0 = solver.solve(kappa, start, computeReach(delta, depth))
  return Number.isNaN(eps0) ? null : readState(solver, load, kappa, eps0)
}

/** The state at kappa between two states of the branch. */
export function solveBetween(
  solver: EquilibriumSolver,
  load: number,
  depth: number,
  from: BranchState,
  to: BranchState,
  kappa: number,
): BranchState | null {
  if (kappa === from.kappa) return from
  if (kappa === to.kappa) return to
  const reach = computeReach(to.kappa - from.kappa, depth)
  const eps0 = solver.solve(kappa, interpolateStrain(from, to, kappa), reach)
  return Number.isNaN(eps0)
    ? continueFrom(solver, load, depth, from, kappa)
    : readState(solver, load, kappa, eps0)
}
