import type { Point, Spiral } from '#shared/document/analysisDocument.ts'

/** Spirals that overlap by the same depth, and places in the overlaps: the middle of each lens and towards its tips. mm. */
export interface Overlap {
  /** Depth of the lens along the line of centres, to the centrelines of the wires. */
  depth: number
  places: Point[]
}

/** Overlaps of circles that cross; a spiral that lies wholly inside another one has no depth to tell. */
export function listOverlaps(spirals: readonly Spiral[]): Overlap[] {
  const overlaps: Overlap[] = []
  spirals.forEach((a, i) => {
    for (const b of spirals.slice(i + 1)) {
      const distance = Math.hypot(b.centre[0] - a.centre[0], b.centre[1] - a.centre[1])
      const depth = (a.diameter + b.diameter) / 2 - distance
      if (depth < 0.05 || distance <= Math.abs(a.diameter - b.diameter) / 2) continue
      const along = (a.diameter / 2 - depth / 2) / distance
      const middle: Point = [
        a.centre[0] + along * (b.centre[0] - a.centre[0]),
        a.centre[1] + along * (b.centre[1] - a.centre[1]),
      ]
      const same = overlaps.find((one) => Math.abs(one.depth - depth) < 0.5)
      if (same) same.places.push(...listPlaces(a, b, middle))
      else overlaps.push({ depth, places: listPlaces(a, b, middle) })
    }
  })
  return overlaps.sort((a, b) => b.depth - a.depth)
}

function listPlaces(a: Spiral, b: Spiral, [x, y]: Point): Point[] {
  const [dx, dy] = [b.centre[0] - a.centre[0], b.centre[1] - a.centre[1]]
  const distance = Math.hypot(dx, dy)
  // From the middle of the lens to its rim, across the line of centres; short of the smaller circle's own.
  const fromA = Math.hypot(x - a.centre[0], y - a.centre[1])
  const fromB = Math.hypot(x - b.centre[0], y - b.centre[1])
  const half = Math.sqrt(
    Math.max(0, Math.min(a.diameter ** 2 / 4 - fromA ** 2, b.diameter ** 2 / 4 - fromB ** 2)),
  )
  return [0, 0.5, -0.5].map((part): Point => [
    x - (part * half * dy) / distance,
    y + (part * half * dx) / distance,
  ])
}
