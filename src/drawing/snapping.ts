import type { Outline, Point, Spiral } from '#shared/document/analysisDocument.ts'
import { computeClearance } from '#shared/geometry/outline.ts'

/** Where a dragged centre comes to rest, and why there. */
export interface Snapped {
  point: Point
  /** Shown beside the dimension; empty for the plain step. */
  reason: string
}

/** mm */
export const step = 5
/** Least cover a snap holds the spiral to, mm; common practice. */
const cover = 50

/**
 * Rests a centre (mm) on the axes, on a diagonal, at equal cover, or on the 5 mm step; `reach` is how near (mm) it must
 * come for that. `free` switches all of it off.
 */
export function snapCentre(
  point: Point,
  spiral: Spiral,
  outline: Outline,
  reach: number,
  free: boolean,
): Snapped {
  if (free) return { point: [round(point[0]), round(point[1])], reason: 'free' }
  let [x, y] = point
  const reasons: string[] = []
  if (Math.abs(x) < reach) {
    x = 0
    reasons.push('on the upright axis')
  }
  if (Math.abs(y) < reach) {
    y = 0
    reasons.push('on the level axis')
  }
  if (reasons.length === 0 && Math.abs(Math.abs(x) - Math.abs(y)) < reach) {
    const size = toStep((Math.abs(x) + Math.abs(y)) / 2)
    const diagonal: Point = [Math.sign(x) * size, Math.sign(y) * size]
    return snapCover(diagonal, spiral, outline, reach, 'on the 45° line')
  }
  return snapCover(
    [x === 0 ? 0 : toStep(x), y === 0 ? 0 : toStep(y)],
    spiral,
    outline,
    reach,
    reasons.join(', '),
  )
}

/** Says when the cover is the usual one; the 5 mm step makes it so. */
function snapCover(point: Point, spiral: Spiral, outline: Outline, reach: number, reason: string): Snapped {
  const outer = (spiral.diameter + spiral.barDiameter) / 2
  const left = computeClearance(outline, point) - outer
  const atCover = Math.abs(left - cover) <= Math.min(reach, step / 2) ? `cover ${Math.round(left)}` : ''
  return { point, reason: [reason, atCover].filter(Boolean).join(', ') }
}

/** To the 5 mm step, or to 0.1 mm where that is switched off. */
export function snapLength(length: number, free: boolean): number {
  return free ? round(length) : Math.max(step, toStep(length))
}

function toStep(value: number): number {
  return Math.round(value / step) * step
}

function round(value: number): number {
  return Math.round(value * 10) / 10
}
