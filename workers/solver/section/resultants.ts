/**
 * Stress resultants of a section and their tangent, in one pass.
 *
 *   strain(v) = eps0 + kappa v          N = sum(sigma A)        M = sum(sigma A v)
 *
 * Concrete: two Gauss stations a cell; a cell in which the law has a kink (crack edge, start and end of spalling) is split
 * there, so that N is smooth while the kink wanders through the cells: without that, the tangent of a softening section
 * jumps and shows folds that are not there. Bars act at their centres; the concrete they displace is deducted.
 */
import { gaussPoint } from '../geometry/stations.ts'
import type { HermiteTable } from '../numeric/hermiteTable.ts'
import type { ConcreteLaw } from './concreteLaw.ts'
import type { SectionModel } from './sectionModel.ts'
import type { SteelLaw } from './steelLaw.ts'

/** Places in the array of resultants. */
export const axialForce = 0
export const moment = 1
/** dN / d eps0 */
export const axialTangent = 2
/** dN / d kappa = dM / d eps0 */
export const couplingTangent = 3
/** dM / d kappa */
export const bendingTangent = 4
export const resultantCount = 5

/** Stress and tangent of the law evaluated last. */
const answer = new Float64Array(2)
/**
 * A cell over which the strain changes by more than this share of the law's peak strain is taken in parts: two stations would
 * miss a curve that rises and falls within it. Their number follows from the curvature alone, so that N stays smooth in eps0.
 */
const partStrain = 0.5
const mostParts = 16
/** v of the kinks of the law at hand. */
const kinkV = new Float64Array(8)

/**
 * Fills `out` (length `resultantCount`; N, N·mm and their derivatives) for the axial strain eps0 at the reference point
 * and the curvature kappa >= 0 (1/mm).
 */
export function computeResultants(model: SectionModel, eps0: number, kappa: number, out: Float64Array): void {
  out.fill(0)
  for (const fibers of model.concretes) {
    accumulateConcrete(model, fibers.law, fibers.area, fibers.ranges, eps0, kappa, out)
  }
  accumulateBars(model, eps0, kappa, out)
}

/** Moment about the other axis (N·mm): sum(sigma A u); exactly 0 for a section symmetric about the v axis. */
export function computeCrossMoment(model: SectionModel, eps0: number, kappa: number): number {
  if (model.symmetric) return 0
  const sums = new Float64Array(resultantCount)
  for (const fibers of model.concretes) {
    accumulateConcrete(model, fibers.law, fibers.uMoment, fibers.ranges, eps0, kappa, sums)
  }
  let cross = sums[axialForce]
  const { v, u, area, groups } = model.bars
  for (const { from, to, steel, displaced } of groups) {
    for (let i = from; i < to; i++) {
      const eps = eps0 + kappa * v[i]
      evaluateSteel(model.steels[steel], eps)
      const stress = answer[0]
      evaluateConcrete(model.concretes[displaced].law, eps)
      cross += (stress - answer[0]) * area[i] * u[i]
    }
  }
  return cross
}

function accumulateBars(model: SectionModel, eps0: number, kappa: number, out: Float64Array): void {
  const { groups } = model.bars
  for (let g = 0; g < groups.length; g++) {
    const { from, to, steel, displaced } = groups[g]
    accumulateBarRange(model, from, to, model.steels[steel], model.concretes[displaced].law, eps0, kappa, out)
  }
}

/** Bars [from, to) of one steel in one concrete. Both tables are read in place: this is half of the work. */
function accumulateBarRange(
  model: SectionModel,
  from: number,
  to: number,
  steel: SteelLaw,
  concrete: ConcreteLaw,
  eps0: number,
  kappa: number,
  out: Float64Array,
): void {
  const { v, area } = model.bars
  const steelTable = steel.table
  const steelTop = steelTable === null ? -1 : steelTable.top
  const steelInverse = steelTable === null ? 0 : steelTable.inverseWidth
  const s = steelTable === null ? concrete.table.coefficients : steelTable.coefficients
  const { top, inverseWidth, coefficients: c, headTop, headInverseWidth, headStart } = concrete.table
  let N = 0
  let M = 0
  let Na = 0
  let Nk = 0
  let Mk = 0
  for (let i = from; i < to; i++) {
    const vi = v[i]
    const eps = eps0 + kappa * vi
    const size = eps < 0 ? -eps : eps
    let stress: number
    let tangent: number
    if (size <= steelTop) {
      const place = size * steelInverse
      const piece = place | 0
      const t = place - piece
      const k = 4 * piece
      stress = s[k] + t * (s[k + 1] + t * (s[k + 2] + t * s[k + 3]))
      tangent = (s[k + 1] + t * (2 * s[k + 2] + 3 * s[k + 3] * t)) * steelInverse
      if (eps < 0) stress = -stress
    } else {
      stress = steel.computeStress(eps)
      tangent = steel.computeTangent(eps)
    }
    if (eps > 0) {
      if (eps <= top) {
        const inverse = eps < headTop ? headInverseWidth : inverseWidth
        const place = eps * inverse
        const piece = place | 0
        const t = place - piece
        const k = 4 * piece + (eps < headTop ? headStart : 0)
        stress -= c[k] + t * (c[k + 1] + t * (c[k + 2] + t * c[k + 3]))
        tangent -= (c[k + 1] + t * (2 * c[k + 2] + 3 * c[k + 3] * t)) * inverse
      } else {
        evaluateConcrete(concrete, eps)
        stress -= answer[0]
        tangent -= answer[1]
      }
    }
    const force = stress * area[i]
    const stiffness = tangent * area[i]
    N += force
    M += force * vi
    Na += stiffness
    Nk += stiffness * vi
    Mk += stiffness * vi * vi
  }
  out[axialForce] += N
  out[moment] += M
  out[axialTangent] += Na
  out[couplingTangent] += Nk
  out[bendingTangent] += Mk
}

/** Adds the cells of one law; `weights` are areas, or first moments in u. */
function accumulateConcrete(
  model: SectionModel,
  law: ConcreteLaw,
  weights: Float64Array,
  ranges: Int32Array,
  eps0: number,
  kappa: number,
  out: Float64Array,
): void {
  const { edges, widest } = model.stations
  const cells = edges.length - 1
  const { kinks } = law
  const spalls = kinks.length > 1
  // Uniform strain has no kink inside a cell.
  if (kappa === 0) {
    if (eps0 > 0 && !(spalls && eps0 >= kinks[kinks.length - 1])) {
      for (let r = 0; r < ranges.length; r += 2) {
        accumulateCells(model, law, weights, ranges[r], ranges[r + 1], eps0, kappa, out)
      }
    }
    return
  }
  for (let k = 0; k < kinks.length; k++) kinkV[k] = (kinks[k] - eps0) / kappa
  const crackCell = findCell(edges, kinkV[0])
  const endCell = spalls ? findCell(edges, kinkV[kinks.length - 1]) : cells
  const parts = Math.min(mostParts, Math.ceil((kappa * widest) / (partStrain * law.peakStrain)))
  for (let r = 0; r < ranges.length; r += 2) {
    const from = ranges[r]
    const to = ranges[r + 1]
    if (parts > 1) {
      const last = Math.min(to - 1, endCell)
      for (let cell = Math.max(from, crackCell); cell <= last; cell++) {
        accumulateSplitCell(model, law, weights, cell, eps0, kappa, parts, out)
      }
      continue
    }
    if (crackCell >= from && crackCell < to) {
      accumulateSplitCell(model, law, weights, crackCell, eps0, kappa, parts, out)
    }
    let next = Math.max(from, crackCell + 1)
    const stop = Math.min(to, endCell)
    for (let k = 1; k < kinks.length - 1; k++) {
      const kinkCell = findCell(edges, kinkV[k])
      if (kinkCell < next || kinkCell >= stop) continue
      accumulateCells(model, law, weights, next, kinkCell, eps0, kappa, out)
      accumulateSplitCell(model, law, weights, kinkCell, eps0, kappa, parts, out)
      next = kinkCell + 1
    }
    accumulateCells(model, law, weights, next, stop, eps0, kappa, out)
    if (spalls && endCell > crackCell && endCell >= from && endCell < to) {
      accumulateSplitCell(model, law, weights, endCell, eps0, kappa, parts, out)
    }
  }
}

/** Whole cells [from, to), all in compression and none with a kink inside. */
function accumulateCells(
  model: SectionModel,
  law: ConcreteLaw,
  weights: Float64Array,
  from: number,
  to: number,
  eps0: number,
  kappa: number,
  out: Float64Array,
): void {
  const { v } = model.stations
  const { top, inverseWidth, coefficients, headTop, headInverseWidth, headStart } = law.table
  const { lineSlope } = law
  const lineEnd = law.kinks[law.kinks.length - 1]
  let N = 0
  let M = 0
  let Na = 0
  let Nk = 0
  let Mk = 0
  for (let s = 2 * from; s < 2 * to; s++) {
    const weight = weights[s]
    if (weight === 0) continue
    const vs = v[s]
    const eps = eps0 + kappa * vs
    let stress: number
    let tangent: number
    if (eps <= top) {
      const inverse = eps < headTop ? headInverseWidth : inverseWidth
      const place = eps * inverse
      const piece = place | 0
      const t = place - piece
      const c = 4 * piece + (eps < headTop ? headStart : 0)
      const c2 = coefficients[c + 2]
      const c3 = coefficients[c + 3]
      stress = coefficients[c] + t * (coefficients[c + 1] + t * (c2 + t * c3))
      tangent = (coefficients[c + 1] + t * (2 * c2 + 3 * c3 * t)) * inverse
    } else if (lineSlope !== 0) {
      // Cells past the last kink are not asked for.
      stress = lineSlope * (eps - lineEnd)
      tangent = lineSlope
    } else {
      evaluateConcrete(law, eps)
      stress = answer[0]
      tangent = answer[1]
    }
    const force = stress * weight
    const stiffness = tangent * weight
    N += force
    M += force * vs
    Na += stiffness
    Nk += stiffness * vs
    Mk += stiffness * vs * vs
  }
  out[axialForce] += N
  out[moment] += M
  out[axialTangent] += Na
  out[couplingTangent] += Nk
  out[bendingTangent] += Mk
}

/**
 * One cell with kinks inside, or in parts: Gauss on each part between them. At a pole the width grows like a square root, so there the
 * parts are taken over the angle theta of the stations, in which it is linear; elsewhere over v.
 */
function accumulateSplitCell(
  model: SectionModel,
  law: ConcreteLaw,
  weights: Float64Array,
  cell: number,
  eps0: number,
  kappa: number,
  parts: number,
  out: Float64Array,
): void {
  const { stations } = model
  const w0 = weights[2 * cell] / stations.weight[2 * cell]
  const w1 = weights[2 * cell + 1] / stations.weight[2 * cell + 1]
  if (w0 === 0 && w1 === 0) return
  const atEnd = stations.atEnd[cell] === 1
  const start = stations.start[cell]
  const radius = stations.length[cell] / 2
  /** Ends of the cell and place of the first station, in theta or v. */
  const lower = atEnd ? stations.thetaFrom[cell] : stations.edges[cell]
  const upper = atEnd ? stations.thetaTo[cell] : stations.edges[cell + 1]
  const first = atEnd ? (lower + upper - gaussPoint * (upper - lower)) / 2 : stations.v[2 * cell]
  const second = atEnd ? (lower + upper + gaussPoint * (upper - lower)) / 2 : stations.v[2 * cell + 1]
  const slope = (w1 - w0) / (second - first)
  const kinkCount = law.kinks.length
  let N = 0
  let M = 0
  let Na = 0
  let Nk = 0
  let Mk = 0
  let from = lower
  for (let k = 0; k <= kinkCount; k++) {
    let to = upper
    if (k < kinkCount) {
      const kink = atEnd ? toTheta(kinkV[k], start, radius) : kinkV[k]
      to = kink < from ? from : kink > upper ? upper : kink
    }
    // Below the first kink there is no stress, nor beyond the last one of concrete that spalls.
    if (k > 0 && to > from && !(k === kinkCount && kinkCount > 1)) {
      const step = (to - from) / parts
      const half = step / 2
      for (let part = 0; part < parts; part++) {
        const begin = from + part * step
        const middle = begin + half
        for (let side = 0; side < 2; side++) {
          const place = middle + (side === 0 ? -gaussPoint : gaussPoint) * half
          let at = place
          let depth = half
          if (atEnd) {
            at = start + radius * (1 - Math.cos(place))
            // The two depths make up that of the part, as in stations.ts.
            const mirrored = 2 * middle - place
            const sine = Math.sin(place)
            const whole = radius * (Math.cos(begin) - Math.cos(begin + step))
            depth = (whole * sine) / (sine + Math.sin(mirrored))
          }
          evaluateConcrete(law, eps0 + kappa * at)
          const area = depth * (w0 + slope * (place - first))
          const force = answer[0] * area
          const stiffness = answer[1] * area
          N += force
          M += force * at
          Na += stiffness
          Nk += stiffness * at
          Mk += stiffness * at * at
        }
      }
    }
    from = to
  }
  out[axialForce] += N
  out[moment] += M
  out[axialTangent] += Na
  out[couplingTangent] += Nk
  out[bendingTangent] += Mk
}

/** Angle of a place v in a piece that starts at `start` and is two radii long; 0 or pi outside. */
function toTheta(v: number, start: number, radius: number): number {
  return Math.acos(Math.max(-1, Math.min(1, 1 - (v - start) / radius)))
}

/** Index of the cell that holds v: -1 below the first, the number of cells above the last. */
function findCell(edges: Float64Array, v: number): number {
  const cells = edges.length - 1
  if (v < edges[0]) return -1
  if (v >= edges[cells]) return cells
  let low = 0
  let high = cells
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (edges[middle] <= v) low = middle
    else high = middle
  }
  return low
}

function evaluateConcrete(law: ConcreteLaw, eps: number): void {
  if (eps <= 0) {
    answer[0] = 0
    answer[1] = 0
  } else if (eps <= law.table.top) {
    readTable(law.table, eps)
  } else if (law.kinks.length > 1) {
    const left = eps - law.kinks[law.kinks.length - 1]
    answer[0] = left < 0 ? law.lineSlope * left : 0
    answer[1] = left < 0 ? law.lineSlope : 0
  } else {
    answer[0] = law.computeStress(eps)
    answer[1] = law.computeTangent(eps)
  }
}

function evaluateSteel(law: SteelLaw, eps: number): void {
  const { table } = law
  const size = Math.abs(eps)
  if (table !== null && size <= table.top) {
    readTable(table, size)
    if (eps < 0) answer[0] = -answer[0]
  } else {
    answer[0] = law.computeStress(eps)
    answer[1] = law.computeTangent(eps)
  }
}

function readTable(table: HermiteTable, x: number): void {
  const { coefficients, headTop } = table
  const inverse = x < headTop ? table.headInverseWidth : table.inverseWidth
  const place = x * inverse
  const piece = place | 0
  const t = place - piece
  const c = 4 * piece + (x < headTop ? table.headStart : 0)
  const c2 = coefficients[c + 2]
  const c3 = coefficients[c + 3]
  answer[0] = coefficients[c] + t * (coefficients[c + 1] + t * (c2 + t * c3))
  answer[1] = (coefficients[c + 1] + t * (2 * c2 + 3 * c3 * t)) * inverse
}
