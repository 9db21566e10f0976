/** The least cover of the spirals, where it can be drawn as a dimension. mm. */
import type { Point, Section, Spiral } from '#shared/document/analysisDocument.ts'
import { computeClearance } from '#shared/geometry/outline.ts'
import { findFace } from './compressedSide.ts'

export interface LeastCover {
  spiral: Spiral
  /** Outside of the wire to the face; negative: the wire stands out. */
  cover: number
  /** The level or upright direction in which it is found; null: it lies askew. */
  towards: Point | null
}

const directions: Point[] = [
  [-1, 0],
  [1, 0],
  [0, -1],
  [0, 1],
]

/** `first`: the direction in which the drawing has most room for it, 0 left or 1 right. */
export function findLeastCover(section: Section, first: 0 | 1 = 0): LeastCover | null {
  let least: LeastCover | null = null
  for (const spiral of section.spirals) {
    const cover =
      computeClearance(section.outline, spiral.centre) - (spiral.diameter + spiral.barDiameter) / 2
    if (!least || cover < least.cover - 1e-6) least = { spiral, cover, towards: null }
  }
  if (!least) return null
  const { spiral, cover } = least
  const outer = (spiral.diameter + spiral.barDiameter) / 2
  const towards = [directions[first], ...directions].find(([dx, dy]) => {
    const face = findFace(section.outline, spiral.centre, [dx, dy])
    const room = (face[0] - spiral.centre[0]) * dx + (face[1] - spiral.centre[1]) * dy
    return Math.abs(room - outer - cover) < 0.05
  })
  return { ...least, towards: towards ?? null }
}
