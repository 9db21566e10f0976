import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Outline, Point } from '#shared/document/analysisDocument.ts'
import {
  computeClearance,
  computeExtent,
  computeOutlineArea,
  computeOutlineBounds,
  computeOutlineCentroid,
  findCrossingSides,
  toBoundary,
  type BoundaryPiece,
} from '#shared/geometry/outline.ts'

const outlines: Record<string, Outline> = {
  circle: { kind: 'circle', diameter: 1200 },
  rectangle: { kind: 'rectangle', width: 1500, depth: 900, chamfer: 0 },
  chamfered: { kind: 'rectangle', width: 1500, depth: 1500, chamfer: 60 },
  'wide oblong': { kind: 'oblong', width: 1850, depth: 1200 },
  'tall oblong': { kind: 'oblong', width: 1200, depth: 1850 },
  'clockwise L': {
    kind: 'polygon',
    points: [
      [0, 0],
      [0, 1000],
      [400, 1000],
      [400, 300],
      [900, 300],
      [900, 0],
    ],
  },
}

function findPoint(piece: BoundaryPiece, t: number): Point {
  if (piece.kind === 'segment') {
    return [
      piece.from[0] + t * (piece.to[0] - piece.from[0]),
      piece.from[1] + t * (piece.to[1] - piece.from[1]),
    ]
  }
  const angle = piece.from + t * (piece.to - piece.from)
  return [piece.centre[0] + piece.radius * Math.cos(angle), piece.centre[1] + piece.radius * Math.sin(angle)]
}

describe.each(Object.entries(outlines))('%s', (_name, outline) => {
  const pieces = toBoundary(outline)

  it('has a boundary that closes', () => {
    pieces.forEach((piece, i) => {
      const end = findPoint(piece, 1)
      const start = findPoint(pieces[(i + 1) % pieces.length], 0)
      expect(Math.hypot(end[0] - start[0], end[1] - start[1])).toBeLessThan(1e-9)
    })
  })

  it('has area and centroid of its boundary, counter-clockwise', () => {
    // Green's theorem over a fine polyline: the chords of 20 000 steps lie within 1e-7 of the arcs' area.
    const steps = 20_000
    const points = pieces.flatMap((piece) =>
      piece.kind === 'segment'
        ? [piece.from]
        : Array.from({ length: steps }, (_, i) => findPoint(piece, i / steps)),
    )
    let area = 0
    let sx = 0
    let sy = 0
    points.forEach(([ax, ay], i) => {
      const [bx, by] = points[(i + 1) % points.length]
      const cross = ax * by - bx * ay
      area += cross / 2
      sx += ((ax + bx) * cross) / 6
      sy += ((ay + by) * cross) / 6
    })
    expect(area / computeOutlineArea(outline)).toBeCloseTo(1, 6)
    const centroid = computeOutlineCentroid(outline)
    expect(sx / area).toBeCloseTo(centroid[0], 4)
    expect(sy / area).toBeCloseTo(centroid[1], 4)
  })

  it('reaches its bounds, and its extent along every direction, at its boundary', () => {
    const points = pieces.flatMap((piece) => Array.from({ length: 721 }, (_, i) => findPoint(piece, i / 720)))
    const bounds = computeOutlineBounds(outline)
    expect(Math.max(...points.map(([x]) => x))).toBeCloseTo(bounds.maxX, 6)
    expect(Math.min(...points.map(([x]) => x))).toBeCloseTo(bounds.minX, 6)
    expect(Math.max(...points.map(([, y]) => y))).toBeCloseTo(bounds.maxY, 6)
    expect(Math.min(...points.map(([, y]) => y))).toBeCloseTo(bounds.minY, 6)
    for (const degrees of [0, 30, 45, 90, 137, 270]) {
      const cos = Math.cos((degrees * Math.PI) / 180)
      const sin = Math.sin((degrees * Math.PI) / 180)
      const along = points.map(([x, y]) => x * cos + y * sin)
      const extent = computeExtent(outline, cos, sin)
      // 1 - cos of half a step of a quarter degree, times 1 m
      expect(Math.abs(Math.max(...along) - extent.greatest)).toBeLessThan(0.01)
      expect(Math.abs(Math.min(...along) - extent.least)).toBeLessThan(0.01)
    }
  })

  it('clearance is nothing on the boundary, and the distance to it beside it', () => {
    for (const piece of pieces) {
      for (const t of [0.05, 0.37, 0.5, 0.81]) {
        const [x, y] = findPoint(piece, t)
        expect(computeClearance(outline, [x, y])).toBeCloseTo(0, 9)
        const [ahead, behind] = [findPoint(piece, t + 1e-6), findPoint(piece, t - 1e-6)]
        const length = Math.hypot(ahead[0] - behind[0], ahead[1] - behind[1])
        const normal = [(behind[1] - ahead[1]) / length, (ahead[0] - behind[0]) / length]
        const beside = (by: number): Point => [x + by * normal[0], y + by * normal[1]]
        expect(computeClearance(outline, beside(2))).toBeCloseTo(2, 5)
        expect(computeClearance(outline, beside(-2))).toBeCloseTo(-2, 5)
      }
    }
  })
})

describe('areas and centroids in closed form', () => {
  it('circle, rectangle less its chamfers, two half-circles with a rectangle between', () => {
    expect(computeOutlineArea(outlines.circle)).toBeCloseTo(Math.PI * 600 ** 2, 6)
    expect(computeOutlineArea(outlines.chamfered)).toBeCloseTo(1500 ** 2 - 2 * 60 ** 2, 6)
    expect(computeOutlineArea(outlines['wide oblong'])).toBeCloseTo(Math.PI * 600 ** 2 + 650 * 1200, 6)
    expect(computeOutlineArea(outlines['tall oblong'])).toBe(computeOutlineArea(outlines['wide oblong']))
  })

  it('the L as two rectangles', () => {
    // 400 x 1000 at (200, 500) and 500 x 300 at (650, 150)
    const area = 400_000 + 150_000
    expect(computeOutlineArea(outlines['clockwise L'])).toBeCloseTo(area, 6)
    const [x, y] = computeOutlineCentroid(outlines['clockwise L'])
    expect(x).toBeCloseTo((400_000 * 200 + 150_000 * 650) / area, 9)
    expect(y).toBeCloseTo((400_000 * 500 + 150_000 * 150) / area, 9)
  })

  it('a polygon far from the origin keeps its centroid', () => {
    const points = (outlines['clockwise L'] as { points: Point[] }).points
    const moved = points.map(([x, y]): Point => [x + 90_000, y - 90_000])
    const [x, y] = computeOutlineCentroid({ kind: 'polygon', points: moved })
    const [x0, y0] = computeOutlineCentroid({ kind: 'polygon', points })
    expect(x - 90_000).toBeCloseTo(x0, 7)
    expect(y + 90_000).toBeCloseTo(y0, 7)
  })
})

/** Level chords at mid-height of strips, no formula of polygons: exact in each strip but for the ends of sides. */
function integrateByStrips(points: readonly Point[], strips: number) {
  const ys = points.map(([, y]) => y)
  const least = Math.min(...ys)
  const height = (Math.max(...ys) - least) / strips
  let area = 0
  let sx = 0
  let sy = 0
  for (let i = 0; i < strips; i++) {
    const y = least + (i + 0.5) * height
    const crossings = points
      .flatMap(([ax, ay], k) => {
        const [bx, by] = points[(k + 1) % points.length]
        return ay > y === by > y ? [] : [ax + ((bx - ax) * (y - ay)) / (by - ay)]
      })
      .sort((a, b) => a - b)
    for (let k = 0; k < crossings.length; k += 2) {
      const chord = (crossings[k + 1] - crossings[k]) * height
      area += chord
      sx += (chord * (crossings[k] + crossings[k + 1])) / 2
      sy += chord * y
    }
  }
  return { area, centroid: [sx / area, sy / area] }
}

it('random polygons, either sense, have the area and centroid of thin strips', () => {
  const radii = fc.array(fc.integer({ min: 200, max: 1000 }), { minLength: 5, maxLength: 12 })
  fc.assert(
    fc.property(radii, fc.boolean(), fc.integer({ min: -2000, max: 2000 }), (spokes, clockwise, offset) => {
      const points = spokes.map((radius, i): Point => {
        const angle = 0.3 + (2 * Math.PI * i) / spokes.length
        return [offset + radius * Math.cos(angle), radius * Math.sin(angle) - offset / 2]
      })
      const outline: Outline = { kind: 'polygon', points: clockwise ? [...points].reverse() : points }
      const strips = integrateByStrips(points, 4000)
      const centroid = computeOutlineCentroid(outline)
      // Strips of 0.5 mm or less: mid-height misses a corner by a triangle below 1e-4 of the area.
      expect(Math.abs(computeOutlineArea(outline) / strips.area - 1)).toBeLessThan(1e-4)
      expect(Math.abs(centroid[0] - strips.centroid[0])).toBeLessThan(0.05)
      expect(Math.abs(centroid[1] - strips.centroid[1])).toBeLessThan(0.05)
      expect(findCrossingSides(outline.points)).toBeNull()
    }),
    { seed: 20_261_201, numRuns: 60 },
  )
})

describe('polygons that are not simple', () => {
  it.each<[string, Point[], [number, number] | null]>([
    [
      'a triangle is simple',
      [
        [0, 0],
        [1, 0],
        [0, 1],
      ],
      null,
    ],
    [
      'a square with a corner on a side is simple',
      [
        [0, 0],
        [1, 0],
        [2, 0],
        [2, 2],
        [0, 2],
      ],
      null,
    ],
    [
      'a bow tie crosses',
      [
        [0, 0],
        [2, 2],
        [2, 0],
        [0, 2],
      ],
      [0, 2],
    ],
    [
      'a corner touches a far side',
      [
        [0, 0],
        [4, 0],
        [4, 4],
        [2, 0],
        [0, 4],
      ],
      [0, 2],
    ],
    [
      'a side folds back on its neighbour',
      [
        [0, 0],
        [4, 0],
        [2, 0],
        [2, 4],
      ],
      [0, 1],
    ],
    [
      'a corner twice',
      [
        [0, 0],
        [4, 0],
        [4, 0],
        [0, 4],
      ],
      [1, 1],
    ],
    [
      'the first corner again at the end',
      [
        [0, 0],
        [4, 0],
        [0, 4],
        [0, 0],
      ],
      [3, 3],
    ],
    [
      'three points on a line',
      [
        [0, 0],
        [1, 0],
        [2, 0],
      ],
      [0, 2],
    ],
  ])('%s', (_name, points, crossing) => {
    expect(findCrossingSides(points)).toEqual(crossing)
  })
})
