/**
 * Exact plane geometry of outlines. Lengths in mm, areas in mm2; x right, y up; circle, rectangle and oblong are
 * centred on (0, 0).
 */
import type { Outline, Point } from '../document/analysisDocument.ts'

/** A piece of the boundary, counter-clockwise: the concrete lies on its left. */
export type BoundaryPiece =
  | { kind: 'segment'; from: Point; to: Point }
  /** Angles in radians from +x; `to` > `from`. */
  | { kind: 'arc'; centre: Point; radius: number; from: number; to: number }

export interface Bounds {
  minX: number
  maxX: number
  minY: number
  maxY: number
}

/** Corners of a rectangle (with its chamfers) or polygon, counter-clockwise; empty for round outlines. */
export function toCorners(outline: Outline): Point[] {
  switch (outline.kind) {
    case 'circle':
    case 'oblong':
      return []
    case 'polygon': {
      const points = outline.points.map(([x, y]): Point => [x, y])
      return computeSignedArea(points) < 0 ? points.reverse() : points
    }
    case 'rectangle': {
      const x = outline.width / 2
      const y = outline.depth / 2
      const c = outline.chamfer
      if (c === 0) {
        return [
          [-x, -y],
          [x, -y],
          [x, y],
          [-x, y],
        ]
      }
      return [
        [-x + c, -y],
        [x - c, -y],
        [x, -y + c],
        [x, y - c],
        [x - c, y],
        [-x + c, y],
        [-x, y - c],
        [-x, -y + c],
      ]
    }
  }
}

export function toBoundary(outline: Outline): BoundaryPiece[] {
  switch (outline.kind) {
    case 'circle':
      return [{ kind: 'arc', centre: [0, 0], radius: outline.diameter / 2, from: 0, to: 2 * Math.PI }]
    case 'oblong': {
      const { radius, reach, level } = measureOblong(outline)
      const quarter = Math.PI / 2
      return level
        ? [
            { kind: 'segment', from: [-reach, -radius], to: [reach, -radius] },
            { kind: 'arc', centre: [reach, 0], radius, from: -quarter, to: quarter },
            { kind: 'segment', from: [reach, radius], to: [-reach, radius] },
            { kind: 'arc', centre: [-reach, 0], radius, from: quarter, to: 3 * quarter },
          ]
        : [
            { kind: 'segment', from: [radius, -reach], to: [radius, reach] },
            { kind: 'arc', centre: [0, reach], radius, from: 0, to: 2 * quarter },
            { kind: 'segment', from: [-radius, reach], to: [-radius, -reach] },
            { kind: 'arc', centre: [0, -reach], radius, from: 2 * quarter, to: 4 * quarter },
          ]
    }
    default: {
      const corners = toCorners(outline)
      return corners.map((from, i) => ({ kind: 'segment', from, to: corners[(i + 1) % corners.length] }))
    }
  }
}

/** Half-circles of `radius` about two centres `reach` from the middle; `level`: they lie left and right. */
export function measureOblong({ width, depth }: { width: number; depth: number }): {
  radius: number
  reach: number
  level: boolean
} {
  const level = width >= depth
  const radius = Math.min(width, depth) / 2
  return { radius, reach: Math.max(width, depth) / 2 - radius, level }
}

export function computeOutlineBounds(outline: Outline): Bounds {
  switch (outline.kind) {
    case 'circle': {
      const r = outline.diameter / 2
      return { minX: -r, maxX: r, minY: -r, maxY: r }
    }
    case 'rectangle':
    case 'oblong': {
      const x = outline.width / 2
      const y = outline.depth / 2
      return { minX: -x, maxX: x, minY: -y, maxY: y }
    }
    case 'polygon': {
      const bounds = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity }
      for (const [x, y] of outline.points) {
        bounds.minX = Math.min(bounds.minX, x)
        bounds.maxX = Math.max(bounds.maxX, x)
        bounds.minY = Math.min(bounds.minY, y)
        bounds.maxY = Math.max(bounds.maxY, y)
      }
      return bounds
    }
  }
}

/** Gross area, voids not deducted, mm2. */
export function computeOutlineArea(outline: Outline): number {
  switch (outline.kind) {
    case 'circle':
      return (Math.PI / 4) * outline.diameter ** 2
    case 'oblong': {
      const { radius, reach } = measureOblong(outline)
      return Math.PI * radius ** 2 + 4 * radius * reach
    }
    default:
      return Math.abs(computeSignedArea(toCorners(outline)))
  }
}

/** Centroid of the gross outline: the reference point of load and moment. */
export function computeOutlineCentroid(outline: Outline): Point {
  if (outline.kind !== 'polygon') return [0, 0]
  const points = toCorners(outline)
  // Taken about the first corner: far from the origin the products would swamp the differences.
  const [ox, oy] = points[0]
  let twiceArea = 0
  let sx = 0
  let sy = 0
  for (let i = 0; i < points.length; i++) {
    const ax = points[i][0] - ox
    const ay = points[i][1] - oy
    const bx = points[(i + 1) % points.length][0] - ox
    const by = points[(i + 1) % points.length][1] - oy
    const cross = ax * by - bx * ay
    twiceArea += cross
    sx += (ax + bx) * cross
    sy += (ay + by) * cross
  }
  return [ox + sx / (3 * twiceArea), oy + sy / (3 * twiceArea)]
}

/** Greatest and least of x cos + y sin over the outline, for the unit vector (cos, sin): its extent along a direction. */
export function computeExtent(
  outline: Outline,
  cos: number,
  sin: number,
): { least: number; greatest: number } {
  switch (outline.kind) {
    case 'circle':
      return { least: -outline.diameter / 2, greatest: outline.diameter / 2 }
    case 'oblong': {
      const { radius, reach, level } = measureOblong(outline)
      const greatest = radius + reach * Math.abs(level ? cos : sin)
      return { least: -greatest, greatest }
    }
    default: {
      let least = Infinity
      let greatest = -Infinity
      for (const [x, y] of toCorners(outline)) {
        const along = x * cos + y * sin
        least = Math.min(least, along)
        greatest = Math.max(greatest, along)
      }
      return { least, greatest }
    }
  }
}

/** Distance (mm) from a point to the boundary: positive inside the outline, negative outside. */
export function computeClearance(outline: Outline, point: Point): number {
  switch (outline.kind) {
    case 'circle':
      return outline.diameter / 2 - Math.hypot(point[0], point[1])
    case 'oblong': {
      const { radius, reach, level } = measureOblong(outline)
      const along = level ? point[0] : point[1]
      const across = level ? point[1] : point[0]
      return radius - Math.hypot(Math.max(0, Math.abs(along) - reach), across)
    }
    default: {
      const corners = toCorners(outline)
      let nearest = Infinity
      for (let i = 0; i < corners.length; i++) {
        nearest = Math.min(
          nearest,
          computeDistanceToSegment(point, corners[i], corners[(i + 1) % corners.length]),
        )
      }
      return isInsideCorners(corners, point) ? nearest : -nearest
    }
  }
}

/**
 * The first two sides of a closed polygon that cross or touch though they are not neighbours; one side twice where it has
 * no length; null: the polygon is simple.
 */
export function findCrossingSides(points: readonly Point[]): [number, number] | null {
  const n = points.length
  const twice = points.findIndex(([x, y], i) => {
    const next = points[(i + 1) % n]
    return x === next[0] && y === next[1]
  })
  if (twice >= 0) return [twice, twice]
  for (let i = 0; i < n; i++) {
    const next = points[(i + 1) % n]
    for (let j = i + 1; j < n; j++) {
      const neighbours = j === i + 1 || (i === 0 && j === n - 1)
      if (neighbours) {
        if (foldsBack(points, i, j)) return [i, j]
      } else if (doSegmentsMeet(points[i], next, points[j], points[(j + 1) % n])) {
        return [i, j]
      }
    }
  }
  return null
}

/** Neighbouring sides that lie on one another. */
function foldsBack(points: readonly Point[], i: number, j: number): boolean {
  const n = points.length
  const [first, second] = j === i + 1 ? [i, j] : [j, i]
  const a = points[first]
  const b = points[second]
  const c = points[(second + 1) % n]
  if (computeTurn(a, b, c) !== 0) return false
  return (b[0] - a[0]) * (c[0] - b[0]) + (b[1] - a[1]) * (c[1] - b[1]) < 0
}

function doSegmentsMeet(a: Point, b: Point, c: Point, d: Point): boolean {
  const d1 = computeTurn(c, d, a)
  const d2 = computeTurn(c, d, b)
  const d3 = computeTurn(a, b, c)
  const d4 = computeTurn(a, b, d)
  if (d1 * d2 < 0 && d3 * d4 < 0) return true
  return (
    (d1 === 0 && isBetween(c, d, a)) ||
    (d2 === 0 && isBetween(c, d, b)) ||
    (d3 === 0 && isBetween(a, b, c)) ||
    (d4 === 0 && isBetween(a, b, d))
  )
}

/** Positive: a, b, c turn counter-clockwise; zero: they lie on a line. */
function computeTurn(a: Point, b: Point, c: Point): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0])
}

/** For a point on the line through a and b. */
function isBetween(a: Point, b: Point, point: Point): boolean {
  return (
    Math.min(a[0], b[0]) <= point[0] &&
    point[0] <= Math.max(a[0], b[0]) &&
    Math.min(a[1], b[1]) <= point[1] &&
    point[1] <= Math.max(a[1], b[1])
  )
}

function computeSignedArea(points: readonly Point[]): number {
  const [ox, oy] = points[0]
  let twice = 0
  for (let i = 0; i < points.length; i++) {
    const [ax, ay] = points[i]
    const [bx, by] = points[(i + 1) % points.length]
    twice += (ax - ox) * (by - oy) - (bx - ox) * (ay - oy)
  }
  return twice / 2
}

function computeDistanceToSegment(point: Point, a: Point, b: Point): number {
  const dx = b[0] - a[0]
  const dy = b[1] - a[1]
  const lengthSquared = dx * dx + dy * dy
  const t = lengthSquared === 0 ? 0 : ((point[0] - a[0]) * dx + (point[1] - a[1]) * dy) / lengthSquared
  const along = Math.min(1, Math.max(0, t))
  return Math.hypot(point[0] - a[0] - along * dx, point[1] - a[1] - along * dy)
}

function isInsideCorners(corners: readonly Point[], [x, y]: Point): boolean {
  let inside = false
  for (let i = 0, j = corners.length - 1; i < corners.length; j = i++) {
    const [ax, ay] = corners[i]
    const [bx, by] = corners[j]
    if (ay > y !== by > y && x < ((bx - ax) * (y - ay)) / (by - ay) + ax) inside = !inside
  }
  return inside
}
