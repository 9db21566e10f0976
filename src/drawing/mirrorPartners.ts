import type { Point, Spiral } from '#shared/document/analysisDocument.ts'

/** A spiral that is kept alike, and how a point of the first one maps onto it. */
export interface Partner {
  id: string
  map(point: Point): Point
}

/** How near (mm) two centres must be to count as mirror images. */
const near = 0.5

const mirrors: ((point: Point) => Point)[] = [
  ([x, y]) => [-x, y],
  ([x, y]) => [x, -y],
  ([x, y]) => [-x, -y],
  ([x, y]) => [y, x],
  ([x, y]) => [-y, -x],
  ([x, y]) => [-y, x],
  ([x, y]) => [y, -x],
]

/**
 * Spirals of the same make whose centres are mirror images of this one's about the axes, the middle or the diagonals.
 * Each is found once, by the first mirror that reaches it.
 */
export function findMirrorPartners(spirals: readonly Spiral[], id: string): Partner[] {
  const first = spirals.find((spiral) => spiral.id === id)
  if (!first) return []
  const partners: Partner[] = []
  for (const map of mirrors) {
    const [x, y] = map(first.centre)
    for (const other of spirals) {
      if (other.id === id || !isAlike(first, other)) continue
      if (partners.some((partner) => partner.id === other.id)) continue
      if (Math.abs(other.centre[0] - x) > near || Math.abs(other.centre[1] - y) > near) continue
      partners.push({ id: other.id, map })
    }
  }
  return partners
}

function isAlike(a: Spiral, b: Spiral): boolean {
  return (
    a.diameter === b.diameter && a.barDiameter === b.barDiameter && a.pitch === b.pitch && a.form === b.form
  )
}
