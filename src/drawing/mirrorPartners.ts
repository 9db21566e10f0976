import type { Point, Spiral } from '#shared/document/analysisDocument.ts'

/** A spiral that is kept alike, and how a point of the first one maps onto it. */
export interface Partner {
  id: string
  map(point: Point): Point
  /** 1: the map turns the plane, so angles keep their sense; -1: it mirrors, so they run the other way. */
  sense: 1 | -1
}

/** How near (mm) two centres must be to count as mirror images. */
const near = 0.5

/** Mirrors about the axes and the diagonals, and the turns that two of them make. */
const symmetries: { map: (point: Point) => Point; sense: 1 | -1 }[] = [
  { map: ([x, y]) => [0 - x, y], sense: -1 },
  { map: ([x, y]) => [x, 0 - y], sense: -1 },
  { map: ([x, y]) => [0 - x, 0 - y], sense: 1 },
  { map: ([x, y]) => [y, x], sense: -1 },
  { map: ([x, y]) => [0 - y, 0 - x], sense: -1 },
  { map: ([x, y]) => [0 - y, x], sense: 1 },
  { map: ([x, y]) => [y, 0 - x], sense: 1 },
]

/**
 * Spirals of the same make whose centres are mirror images of this one's about the axes or the diagonals.
 * Each is found once, by the first symmetry that reaches it.
 */
export function findMirrorPartners(spirals: readonly Spiral[], id: string): Partner[] {
  const first = spirals.find((spiral) => spiral.id === id)
  if (!first) return []
  const partners: Partner[] = []
  for (const { map, sense } of symmetries) {
    const [x, y] = map(first.centre)
    for (const other of spirals) {
      if (other.id === id || !isAlike(first, other)) continue
      if (partners.some((partner) => partner.id === other.id)) continue
      if (Math.abs(other.centre[0] - x) > near || Math.abs(other.centre[1] - y) > near) continue
      partners.push({ id: other.id, map, sense })
    }
  }
  return partners
}

function isAlike(a: Spiral, b: Spiral): boolean {
  return (
    a.diameter === b.diameter && a.barDiameter === b.barDiameter && a.pitch === b.pitch && a.form === b.form
  )
}
