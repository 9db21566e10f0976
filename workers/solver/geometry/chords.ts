/**
 * Chords: where lines of constant v cut outlines and circles, as intervals of u (mm), in the axes of bending.
 */
import type { Outline } from '#shared/document/analysisDocument.ts'
import { measureOblong, toCorners } from '#shared/geometry/outline.ts'
import { toU, toV, type BendingAxes } from './axes.ts'

/** A circle in the axes of bending. */
export interface TurnedCircle {
  u: number
  v: number
  radius: number
}

export interface OutlineChords {
  /** v of corners and of the lowest and highest points of arcs: between them the width is smooth. */
  breaks: number[]
  /** Fills `out` with the ends of the intervals, ascending, two for each; tells how many ends. */
  cut(v: number, out: Float64Array): number
  /** The most intervals a line can have, times two. */
  most: number
}

export function createOutlineChords(outline: Outline, axes: BendingAxes): OutlineChords {
  switch (outline.kind) {
    case 'circle':
      return createCircleChords({ u: 0, v: 0, radius: outline.diameter / 2 })
    case 'oblong':
      return createOblongChords(outline, axes)
    default:
      return createCornerChords(
        toCorners(outline).map(([x, y]) => ({ u: toU(axes, x, y), v: toV(axes, x, y) })),
      )
  }
}

function createCircleChords({ u, v, radius }: TurnedCircle): OutlineChords {
  return {
    breaks: [v - radius, v + radius],
    most: 2,
    cut(at, out) {
      const half = computeHalfChord(radius, at - v)
      out[0] = u - half
      out[1] = u + half
      return half > 0 ? 2 : 0
    },
  }
}

/** The oblong is what a circle sweeps between its two centres: the hull of two equal circles. */
function createOblongChords(outline: { width: number; depth: number }, axes: BendingAxes): OutlineChords {
  const { radius, reach, level } = measureOblong(outline)
  const a = level ? axes.ux * reach : axes.uy * reach
  const b = level ? axes.vx * reach : axes.vy * reach
  // Centres at (a, b) and (-a, -b); the straight sides touch the circles a quarter turn from the line of centres.
  const length = Math.hypot(a, b)
  const nu = length > 0 ? -b / length : 0
  const nv = length > 0 ? a / length : 1
  const sides = [1, -1].map((side) => ({
    fromU: -a + side * nu * radius,
    fromV: -b + side * nv * radius,
    toU: a + side * nu * radius,
    toV: b + side * nv * radius,
  }))
  const breaks = [b - radius, b + radius, -b - radius, -b + radius]
  for (const side of sides) breaks.push(side.fromV, side.toV)
  return {
    breaks,
    most: 2,
    cut(at, out) {
      let least = Infinity
      let greatest = -Infinity
      const take = (u: number) => {
        if (u < least) least = u
        if (u > greatest) greatest = u
      }
      for (const sign of [1, -1]) {
        const half = computeHalfChord(radius, at - sign * b)
        if (half > 0) {
          take(sign * a - half)
          take(sign * a + half)
        }
      }
      for (const { fromU, fromV, toU: endU, toV: endV } of sides) {
        if (fromV === endV || at < Math.min(fromV, endV) || at > Math.max(fromV, endV)) continue
        take(fromU + ((at - fromV) / (endV - fromV)) * (endU - fromU))
      }
      out[0] = least
      out[1] = greatest
      return greatest > least ? 2 : 0
    },
  }
}

function createCornerChords(corners: { u: number; v: number }[]): OutlineChords {
  const n = corners.length
  return {
    breaks: corners.map((corner) => corner.v),
    most: n + 2,
    cut(at, out) {
      let count = 0
      for (let i = 0; i < n; i++) {
        const from = corners[i]
        const to = corners[(i + 1) % n]
        if (from.v > at === to.v > at) continue
        const u = from.u + ((at - from.v) / (to.v - from.v)) * (to.u - from.u)
        // Insertion keeps the few ends of a line in order.
        let place = count
        while (place > 0 && out[place - 1] > u) {
          out[place] = out[place - 1]
          place -= 1
        }
        out[place] = u
        count += 1
      }
      return count
    },
  }
}

/** Half the chord of a circle at a distance from its centre; 0 outside. */
export function computeHalfChord(radius: number, distance: number): number {
  const square = radius * radius - distance * distance
  return square > 0 ? Math.sqrt(square) : 0
}

/** v of the points where two circles cross; none when they are apart or one lies inside the other. */
export function findCrossings(one: TurnedCircle, other: TurnedCircle): number[] {
  const du = other.u - one.u
  const dv = other.v - one.v
  const d = Math.hypot(du, dv)
  if (d === 0 || d >= one.radius + other.radius || d <= Math.abs(one.radius - other.radius)) return []
  const along = (d * d + one.radius * one.radius - other.radius * other.radius) / (2 * d)
  const across = computeHalfChord(one.radius, along)
  const foot = one.v + (along * dv) / d
  return [foot + (across * du) / d, foot - (across * du) / d]
}
