/**
 * Walks the branch from zero curvature to where the analysis ends, and locates on the way every limit state and the end
 * itself. Steps are small against the curvature at first yield and grow; a step without a solution is halved until the
 * fold of the branch is known to `foldTolerance`.
 */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { StopReason } from '#shared/document/analysisResult.ts'
import { findRoot } from '../numeric/roots.ts'
import type { EquilibriumSolver } from '../section/equilibrium.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import { continueFrom, interpolateStrain, solveBetween, type BranchState } from './branch.ts'
import { computeExcess, type WatchedStrain } from './watched.ts'

export interface ReachedLimit {
  watched: WatchedStrain
  state: BranchState
}

export interface Walk {
  /** Ascending; the first at zero curvature, the last at the stop. */
  states: BranchState[]
  /** By curvature, up to the stop, ties included. */
  reached: ReachedLimit[]
  stop: { reason: StopReason; item?: string }
}

/** The curvature at which an analysis ends whatever happens, times the depth along v. */
export const curvatureLimitByDepth = 0.25
/** Share of the greatest moment so far below which the moment has dropped. */
export const dropShare = 0.8

const firstStepByYield = 0.2
const stepGrowth = 1.1
const stepsToLimit = 110
/** Relative to the curvature. */
const foldTolerance = 2e-7
/** Strain by which a step may miss what the slopes at its ends tell. */
const leastJump = 3e-4
/** Relative difference of curvatures that count as one. */
const tie = 1e-7
/** Relative change of the curvature with which a limit state counts as located. */
const located = 1e-8

export interface BranchContext {
  solver: EquilibriumSolver
  /** N */
  load: number
  /** Depth of the outline along v, mm. */
  depth: number
}

export function walkBranch(
  context: BranchContext,
  model: SectionModel,
  watched: readonly WatchedStrain[],
  start: BranchState,
  endAt: AnalysisDocument['analysis']['endAt'],
): Walk {
  const { solver, load, depth } = context
  const states = [start]
  const reached: ReachedLimit[] = []
  const ends = (limit: WatchedStrain) => endAt === 'first-limit' && limit.ends
  const open = new Set(watched)
  for (const limit of watched) {
    if (computeExcess(limit, start) < 0) continue
    open.delete(limit)
    reached.push({ watched: limit, state: start })
  }
  const atStart = reached.find((one) => ends(one.watched))
  if (atStart) return { states, reached, stop: toStop(atStart.watched) }

  const limitKappa = curvatureLimitByDepth / depth
  const yieldStrain = model.steels.reduce((least, steel) => Math.min(least, steel.yieldStrain), 0.002)
  let step = Math.min((firstStepByYield * yieldStrain) / depth, limitKappa / stepsToLimit)
  let failedAt = Infinity
  let greatest = start

  for (;;) {
    const from = states[states.length - 1]
    const wanted = Math.min(from.kappa + step, limitKappa)
    const kappa = wanted < failedAt ? wanted : (from.kappa + failedAt) / 2
    if (failedAt < Infinity && failedAt - from.kappa <= foldTolerance * failedAt) {
      return { states, reached, stop: { reason: 'no-equilibrium' } }
    }
    const to = continueFrom(solver, load, depth, from, kappa, states[states.length - 2])
    if (!to) {
      failedAt = kappa
      continue
    }
    if (isJump(from, to)) {
      step = (kappa - from.kappa) / 2
      if (step <= foldTolerance * kappa) return { states, reached, stop: { reason: 'no-equilibrium' } }
      continue
    }

    const crossed = [...open].flatMap((limit): ReachedLimit[] => {
      if (computeExcess(limit, to) < 0) return []
      return [{ watched: limit, state: locateLimit(context, from, to, limit) }]
    })
    const lost = from.moment > 0 && to.moment <= 0 ? locateMoment(context, from, to, 0) : null
    const drop = endAt === 'moment-drop-20' ? findDrop(context, [...states, to], greatest) : null
    const candidates: { state: BranchState; stop: Walk['stop'] }[] = crossed
      .filter((one) => ends(one.watched))
      .map(({ watched: limit, state }) => ({ state, stop: toStop(limit) }))
    if (drop) candidates.push({ state: drop, stop: { reason: 'moment-drop-20' } })
    if (lost) candidates.push({ state: lost, stop: { reason: 'moment-lost' } })
    if (candidates.length === 0 && kappa === limitKappa) {
      candidates.push({ state: to, stop: { reason: 'curvature-limit' } })
    }
    const first = candidates.reduce<(typeof candidates)[number] | null>(
      (least, one) => (least === null || one.state.kappa < least.state.kappa * (1 - tie) ? one : least),
      null,
    )
    const last = first ? first.state : to
    for (const one of crossed) {
      if (one.state.kappa > last.kappa * (1 + tie)) continue
      // What is reached together with the stop stands on it.
      const together = first !== null && one.state.kappa >= last.kappa * (1 - tie)
      reached.push(together ? { ...one, state: last } : one)
      open.delete(one.watched)
    }
    if (first) {
      while (states[states.length - 1].kappa >= last.kappa && states.length > 1) states.pop()
      states.push(last)
      reached.sort((a, b) => a.state.kappa - b.state.kappa)
      return { states, reached, stop: first.stop }
    }
    states.push(to)
    if (to.moment > greatest.moment) greatest = to
    step *= to.iterations <= 4 ? stepGrowth : 1
    step = Math.min(step, limitKappa / stepsToLimit)
  }
}

/**
 * The step may have led past a fold to another branch: on one branch the strain changes by about the mean of the slopes at
 * the ends of a step, the better the shorter the step; past a fold the difference stays.
 */
function isJump(from: BranchState, to: BranchState): boolean {
  const expected = ((from.strainSlope + to.strainSlope) / 2) * (to.kappa - from.kappa)
  return Math.abs(to.eps0 - from.eps0 - expected) > leastJump
}

function toStop(limit: WatchedStrain): Walk['stop'] {
  const reason = limit.kind as StopReason
  return limit.item === undefined ? { reason } : { reason, item: limit.item }
}

/** The state between two others in which a watched strain reaches its limit, by Newton on the curvature. */
export function locateLimit(
  { solver, load, depth }: BranchContext,
  from: BranchState,
  to: BranchState,
  limit: WatchedStrain,
): BranchState {
  const guess = (kappa: number) =>
    computeExcess(limit, { ...from, kappa, eps0: interpolateStrain(from, to, kappa) })
  const sign = limit.limit > 0 ? 1 : -1
  let kappa = findRoot(
    guess,
    from.kappa,
    to.kappa,
    1e-6 * to.kappa,
    computeExcess(limit, from),
    computeExcess(limit, to),
  )
  for (let i = 0; i < 8; i++) {
    const state = solveBetween(solver, load, depth, from, to, kappa)
    if (!state) break
    const excess = computeExcess(limit, state)
    const slope = sign * (state.strainSlope + limit.v)
    const next = kappa - excess / slope
    if (!(next >= from.kappa * (1 - located) && next <= to.kappa * (1 + located))) break
    if (Math.abs(next - kappa) <= located * kappa) return state
    kappa = next
  }
  // The strain hardly moves here: close in on it from both sides.
  return closeIn({ solver, load, depth }, from, to, (state) => computeExcess(limit, state))
}

/** The state between two others in which the moment takes a value that it passes between them. */
export function locateMoment(
  context: BranchContext,
  from: BranchState,
  to: BranchState,
  moment: number,
): BranchState {
  return closeIn(context, from, to, (state) => state.moment - moment)
}

/** The state between two others in which a quantity that changes its sign is zero. */
export function closeIn(
  { solver, load, depth }: BranchContext,
  from: BranchState,
  to: BranchState,
  quantity: (state: BranchState) => number,
): BranchState {
  let latest = to
  const f = (kappa: number) => {
    latest = solveBetween(solver, load, depth, from, to, kappa) ?? latest
    return quantity(latest)
  }
  const kappa = findRoot(f, from.kappa, to.kappa, located * to.kappa, quantity(from), quantity(to))
  return solveBetween(solver, load, depth, from, to, kappa) ?? latest
}

/** Greatest moment near a state of the branch: where dM/d kappa changes its sign beside it, else the state itself. */
export function locatePeak(
  context: BranchContext,
  states: readonly BranchState[],
  index: number,
): BranchState {
  const state = states[index]
  const rises = state.momentSlope > 0
  const other = states[index + (rises ? 1 : -1)]
  if (!other || state.momentSlope === 0 || other.momentSlope > 0 === rises) return state
  const [from, to] = rises ? [state, other] : [other, state]
  const peak = closeIn(context, from, to, (one) => one.momentSlope)
  return peak.moment >= state.moment ? peak : state
}

/** First state in which the moment has dropped by 20 % from the greatest before it; null: it has not. */
export function findDrop(
  context: BranchContext,
  states: readonly BranchState[],
  known?: BranchState,
): BranchState | null {
  const last = states[states.length - 1]
  // Cheap refusal: most calls come while nothing has dropped.
  if (known && !(known.moment > 0 && last.moment < dropShare * known.moment * 1.05)) return null
  let greatest = -Infinity
  for (let i = 0; i < states.length; i++) {
    if (greatest > 0 && states[i].moment < dropShare * greatest) {
      return locateMoment(context, states[i - 1], states[i], dropShare * greatest)
    }
    if (states[i].moment > greatest) {
      greatest = locatePeak(context, states, i).moment
    }
  }
  return null
}
