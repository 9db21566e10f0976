/**
 * Which curvatures the rows of a curve stand at: `points` of them from zero to the stop, dense where the curve bends,
 * so that straight lines between rows miss it by little.
 */
import { solveBetween, type BranchState } from './branch.ts'
import type { BranchContext } from './walk.ts'

/** Share of the rows spread evenly over the curvature. */
const evenShare = 0.2
/** Moments below this share of the greatest are no more precise than it. */
const leastMomentShare = 0.05
/** Rows nearer to one another than this, relative to the last, are one. */
const sameRow = 1e-9

/**
 * Rows at `points` curvatures over the walked states, and one more for each of `extra` that is not already one.
 * A line between rows kappa1 and kappa2 misses the curve by |M''| (kappa2 - kappa1)^2 / 8: rows are laid so that this is
 * alike everywhere, relative to the moment.
 */
export function layRows(
  context: BranchContext,
  states: readonly BranchState[],
  points: number,
  extra: readonly BranchState[],
): BranchState[] {
  const last = states[states.length - 1]
  if (states.length === 1) return [states[0]]
  const cumulative = computeCumulativeDensity(states)
  const rows: BranchState[] = [states[0]]
  let interval = 0
  for (let i = 1; i < points - 1; i++) {
    const share = i / (points - 1)
    while (cumulative[interval + 1] < share) interval += 1
    const from = states[interval]
    const to = states[interval + 1]
    const t = (share - cumulative[interval]) / (cumulative[interval + 1] - cumulative[interval])
    const kappa = from.kappa + t * (to.kappa - from.kappa)
    // The row before is nearer than the walked state: a shorter interval starts Newton closer.
    const near = rows[rows.length - 1].kappa > from.kappa ? rows[rows.length - 1] : from
    const state = solveBetween(context.solver, context.load, context.depth, near, to, kappa)
    if (state) rows.push(state)
  }
  rows.push(last)
  return insertRows(rows, extra)
}

/** Rows with further states in their places; a state that is a row already takes that row's place. */
export function insertRows(rows: readonly BranchState[], extra: readonly BranchState[]): BranchState[] {
  const near = sameRow * rows[rows.length - 1].kappa
  const all = [...rows]
  for (const state of extra) {
    const place = all.findIndex((row) => row.kappa >= state.kappa - near)
    if (place === -1) all.push(state)
    else if (Math.abs(all[place].kappa - state.kappa) <= near) continue
    else all.splice(place, 0, state)
  }
  return all
}

/** The row that stands for a state: itself, or one so near that they are one. */
export function findRow(rows: readonly BranchState[], state: BranchState): BranchState {
  const near = sameRow * rows[rows.length - 1].kappa
  return rows.find((row) => Math.abs(row.kappa - state.kappa) <= near) ?? state
}

function computeCumulativeDensity(states: readonly BranchState[]): number[] {
  const stop = states[states.length - 1].kappa
  const greatest = states.reduce((most, state) => Math.max(most, Math.abs(state.moment)), 0)
  const bends: number[] = []
  for (let i = 1; i < states.length; i++) {
    const from = states[i - 1]
    const to = states[i]
    const delta = to.kappa - from.kappa
    const size = Math.max(
      Math.min(Math.abs(from.moment), Math.abs(to.moment)),
      leastMomentShare * greatest,
      Number.MIN_VALUE,
    )
    const bend = Math.abs(to.momentSlope - from.momentSlope) / delta
    bends.push(Math.sqrt(bend / size) * delta)
  }
  const total = bends.reduce((sum, bend) => sum + bend, 0)
  const cumulative = [0]
  for (let i = 1; i < states.length; i++) {
    const even = (states[i].kappa - states[i - 1].kappa) / stop
    const share = total > 0 ? (1 - evenShare) * (bends[i - 1] / total) + evenShare * even : even
    cumulative.push(cumulative[i - 1] + share)
  }
  cumulative[cumulative.length - 1] = 1 + Number.EPSILON
  return cumulative
}
