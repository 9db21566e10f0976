import type { Outline, Point } from '#shared/document/analysisDocument.ts'
import { computeExtent, computeOutlineCentroid } from '#shared/geometry/outline.ts'

/**
 * Axes of bending. The reference point is the centroid of the gross outline; v runs towards the compressed side, which
 * the angle turns counter-clockwise from +y; u is v turned 90 degrees clockwise (+x at angle 0). mm.
 */
export interface BendingAxes {
  origin: Point
  /** v = (x - ox) vx + (y - oy) vy */
  vx: number
  vy: number
  /** u = (x - ox) ux + (y - oy) uy */
  ux: number
  uy: number
  /** Most compressed and least compressed point of the outline along v. */
  vTop: number
  vBottom: number
}

/** Axes for an angle in degrees. Multiples of 90 are exact, so that a symmetric section stays symmetric. */
export function createBendingAxes(outline: Outline, angle: number): BendingAxes {
  const { cos, sin } = computeTurn(angle)
  const origin = computeOutlineCentroid(outline)
  const vx = -sin
  const vy = cos
  const offset = origin[0] * vx + origin[1] * vy
  const { least, greatest } = computeExtent(outline, vx, vy)
  return { origin, vx, vy, ux: cos, uy: sin, vTop: greatest - offset, vBottom: least - offset }
}

export function toV(axes: BendingAxes, x: number, y: number): number {
  return (x - axes.origin[0]) * axes.vx + (y - axes.origin[1]) * axes.vy
}

export function toU(axes: BendingAxes, x: number, y: number): number {
  return (x - axes.origin[0]) * axes.ux + (y - axes.origin[1]) * axes.uy
}

function computeTurn(angle: number): { cos: number; sin: number } {
  const quarter = angle / 90
  if (Number.isInteger(quarter)) {
    const turns = ((quarter % 4) + 4) % 4
    return { cos: [1, 0, -1, 0][turns], sin: [0, 1, 0, -1][turns] }
  }
  const radians = (angle * Math.PI) / 180
  return { cos: Math.cos(radians), sin: Math.sin(radians) }
}
