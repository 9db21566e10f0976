/** Exact geometry of pairs of circles. Lengths in mm, areas in mm2. */
import type { Point } from '../document/analysisDocument.ts'

export interface Circle {
  centre: Point
  diameter: number
}

/**
 * Area (mm2) that two circles share; radii and distance d of the centres in mm. Apart: 0; one inside the other: the
 * smaller circle. Closed form of the circular lens (two circular segments).
 */
export function computeLensArea(r1: number, r2: number, d: number): number {
  if (d >= r1 + r2) return 0
  const smaller = Math.min(r1, r2)
  if (d <= Math.abs(r1 - r2)) return Math.PI * smaller * smaller
  const half1 = Math.acos((d * d + r1 * r1 - r2 * r2) / (2 * d * r1))
  const half2 = Math.acos((d * d + r2 * r2 - r1 * r1) / (2 * d * r2))
  const kite = 0.5 * Math.sqrt((-d + r1 + r2) * (d + r1 - r2) * (d - r1 + r2) * (d + r1 + r2))
  return r1 * r1 * half1 + r2 * r2 * half2 - kite
}

/**
 * The two points (mm) where circles cross, the one on the left of the way from the first centre to the second coming
 * first; [] where they are apart, one inside the other, or touch.
 */
export function computeCrossings(first: Circle, second: Circle): Point[] {
  const r1 = first.diameter / 2
  const r2 = second.diameter / 2
  const dx = second.centre[0] - first.centre[0]
  const dy = second.centre[1] - first.centre[1]
  const d = Math.hypot(dx, dy)
  if (d >= r1 + r2 || d <= Math.abs(r1 - r2)) return []
  const along = (d * d + r1 * r1 - r2 * r2) / (2 * d)
  const half = Math.sqrt(Math.max(0, r1 * r1 - along * along))
  const x = first.centre[0] + (along * dx) / d
  const y = first.centre[1] + (along * dy) / d
  return [
    [x - (half * dy) / d, y + (half * dx) / d],
    [x + (half * dy) / d, y - (half * dx) / d],
  ]
}

/** Whether a point lies strictly within a circle. */
export function isWithinCircle({ centre, diameter }: Circle, [x, y]: Point): boolean {
  return Math.hypot(x - centre[0], y - centre[1]) < diameter / 2
}
