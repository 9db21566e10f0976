/**
 * Where a part that is dragged comes to rest, and why there. A place is tried against what stands out first (a common
 * centre, an axis, the diagonal), then along that line against cover and tangency, then against the 5 mm step. mm.
 */
import type { Outline, Point, Section, Spiral } from '#shared/document/analysisDocument.ts'
import { computeClearance, computeOutlineCentroid } from '#shared/geometry/outline.ts'
import { formatSize } from './size.ts'

export interface Snapped {
  point: Point
  /** Shown beside the dimension; empty for the plain step. */
  reason: string
}

export interface SnappedLength {
  length: number
  reason: string
}

export interface SnapContext {
  section: Section
  /** Spirals that move along and cannot be snapped to. */
  moving: readonly string[]
  /** How near (mm) a snap catches. */
  reach: number
  /** Switches every snap off: to 0.1 mm. */
  free: boolean
}

/** mm */
export const step = 5
/** Cover held where no other spiral gives one, mm; common practice. */
const usualCover = 50

type Direction = readonly [number, number]

/** Rests the centre of a spiral. */
export function snapCentre(wanted: Point, spiral: Spiral, context: SnapContext): Snapped {
  const { section, reach, free } = context
  if (free) return { point: [toTenth(wanted[0]), toTenth(wanted[1])], reason: 'free of snaps' }
  const others = section.spirals.filter(
    (other) => other.id !== spiral.id && !context.moving.includes(other.id),
  )
  for (const other of others) {
    if (measure(wanted, other.centre) < reach) {
      return { point: [...other.centre], reason: `concentric with ${other.id}` }
    }
  }

  const [ox, oy] = computeOutlineCentroid(section.outline).map(toTenth)
  const onUpright = Math.abs(wanted[0] - ox) < reach
  const onLevel = Math.abs(wanted[1] - oy) < reach
  if (onUpright && onLevel) return { point: [ox, oy], reason: 'in the middle' }
  if (onUpright) {
    return snapAlong([ox, wanted[1]], [0, 1], spiral, others, context, 'on the upright axis')
  }
  if (onLevel) return snapAlong([wanted[0], oy], [1, 0], spiral, others, context, 'on the level axis')

  const [dx, dy] = [wanted[0] - ox, wanted[1] - oy]
  if (Math.abs(Math.abs(dx) - Math.abs(dy)) < reach * Math.SQRT2) {
    const size = (Math.abs(dx) + Math.abs(dy)) / 2
    const along: Direction = [Math.sign(dx) / Math.SQRT2, Math.sign(dy) / Math.SQRT2]
    const point: Point = [ox + Math.sign(dx) * size, oy + Math.sign(dy) * size]
    return snapAlong(point, along, spiral, others, context, 'on the 45° line')
  }

  const nearest = findNearest(wanted, spiral, others, context)
  if (nearest) return nearest
  return { point: [toStep(wanted[0]), toStep(wanted[1])], reason: '' }
}

/** Rests a centre that stays on a line: at cover, tangent, or on the step of both its coordinates. */
function snapAlong(
  point: Point,
  along: Direction,
  spiral: Spiral,
  others: readonly Spiral[],
  { section, reach }: SnapContext,
  reason: string,
): Snapped {
  let best: { point: Point; reason: string; far: number } | null = null
  for (const { gap, reason: why } of listGaps(spiral, others, section.outline)) {
    const t = findZero((t) => gap(shift(point, along, t)), reach)
    if (t === null || (best && Math.abs(t) >= best.far)) continue
    best = { point: shift(point, along, t), reason: why, far: Math.abs(t) }
  }
  if (best) return { point: toTenths(best.point), reason: `${reason}, ${best.reason}` }
  const [ox, oy] = computeOutlineCentroid(section.outline).map(toTenth)
  if (along[0] === 0) return { point: [point[0], toStep(point[1])], reason }
  if (along[1] === 0) return { point: [toStep(point[0]), point[1]], reason }
  const size = toStep(Math.abs(point[0] - ox))
  return { point: [ox + Math.sign(along[0]) * size, oy + Math.sign(along[1]) * size], reason }
}

/** The cover or tangency nearest to a free place, if one is within reach; the other coordinate keeps to the step. */
function findNearest(
  wanted: Point,
  spiral: Spiral,
  others: readonly Spiral[],
  { section, reach }: SnapContext,
): Snapped | undefined {
  for (const { gap, reason } of listGaps(spiral, others, section.outline)) {
    const h = 0.5
    const gx = gap([wanted[0] + h, wanted[1]]) - gap([wanted[0] - h, wanted[1]])
    const gy = gap([wanted[0], wanted[1] + h]) - gap([wanted[0], wanted[1] - h])
    const length = Math.hypot(gx, gy)
    if (length < 1e-9) continue
    const along: Direction = [gx / length, gy / length]
    // A level or upright face fixes one coordinate: the other one may keep to the step.
    const start: Point = [
      Math.abs(along[0]) < 1e-6 ? toStep(wanted[0]) : wanted[0],
      Math.abs(along[1]) < 1e-6 ? toStep(wanted[1]) : wanted[1],
    ]
    const t = findZero((t) => gap(shift(start, along, t)), reach)
    if (t !== null) return { point: toTenths(shift(start, along, t)), reason }
  }
  return undefined
}

interface Gap {
  /** Zero where the snap holds. */
  gap(centre: Point): number
  reason: string
}

/** Equal cover first, then tangency to each of the other spirals, outside and inside. */
function listGaps(spiral: Spiral, others: readonly Spiral[], outline: Outline): Gap[] {
  const cover = findStatedCover(others, outline)
  const outer = (spiral.diameter + spiral.barDiameter) / 2
  const gaps: Gap[] = [
    {
      gap: (centre) => computeClearance(outline, centre) - outer - cover,
      reason: `cover ${formatSize(cover)}`,
    },
  ]
  for (const other of others) {
    const bars = (spiral.barDiameter + other.barDiameter) / 2
    const apart = (spiral.diameter + other.diameter) / 2 + bars
    const within = Math.abs(spiral.diameter - other.diameter) / 2 - bars
    gaps.push({
      gap: (centre) => measure(centre, other.centre) - apart,
      reason: `tangent to ${other.id}`,
    })
    if (within > 0) {
      gaps.push({
        gap: (centre) => measure(centre, other.centre) - within,
        reason: `tangent within ${spiral.diameter < other.diameter ? other.id : spiral.id}`,
      })
    }
  }
  return gaps
}

/** Rests the diameter of a spiral: at cover, tangent to a neighbour, or on the step. */
export function snapSpiralDiameter(wanted: number, spiral: Spiral, context: SnapContext): SnappedLength {
  const { section, reach, free } = context
  if (free) return { length: toTenth(wanted), reason: 'free of snaps' }
  const others = section.spirals.filter(
    (other) => other.id !== spiral.id && !context.moving.includes(other.id),
  )
  const cover = findStatedCover(others, section.outline)
  const { centre, barDiameter } = spiral
  const stops: SnappedLength[] = [
    {
      length: 2 * (computeClearance(section.outline, centre) - cover) - barDiameter,
      reason: `cover ${formatSize(cover)}`,
    },
  ]
  for (const other of others) {
    const apart = measure(centre, other.centre)
    const bars = (barDiameter + other.barDiameter) / 2
    stops.push({ length: 2 * (apart - bars) - other.diameter, reason: `tangent to ${other.id}` })
    stops.push({ length: other.diameter - 2 * (apart + bars), reason: `tangent within ${other.id}` })
  }
  return snapToStops(wanted, stops, reach)
}

/** Rests the diameter of a ring of bars: bars against the inside of the spiral, or on the step. */
export function snapRingDiameter(
  wanted: number,
  barDiameter: number,
  owner: Spiral | undefined,
  { reach, free }: SnapContext,
): SnappedLength {
  if (free) return { length: toTenth(wanted), reason: 'free of snaps' }
  const stops = owner
    ? [
        {
          length: owner.diameter - owner.barDiameter - barDiameter,
          reason: `bars on the wire of ${owner.id}`,
        },
      ]
    : []
  return snapToStops(wanted, stops, reach)
}

/** Rests a start angle (degrees): a bar on an axis or on a diagonal, else whole degrees. */
export function snapStartAngle(
  wanted: number,
  count: number,
  free: boolean,
): { angle: number; reason: string } {
  if (free) return { angle: toTenth(wanted), reason: 'free of snaps' }
  const pitch = 360 / count
  for (const [mark, reason] of [
    [90, 'a bar on the upright axis'],
    [90 + pitch / 2, 'the upright axis between two bars'],
    [45, 'a bar on the 45° line'],
    [45 + pitch / 2, 'the 45° line between two bars'],
  ] as const) {
    const off = mark - wanted
    const rest = off - Math.round(off / pitch) * pitch
    if (Math.abs(rest) < 1) return { angle: wanted + rest, reason }
  }
  return { angle: Math.round(wanted), reason: '' }
}

function snapToStops(wanted: number, stops: readonly SnappedLength[], reach: number): SnappedLength {
  // A diameter changes twice as fast as the edge that is held.
  const near = stops
    .filter(({ length }) => length > 0 && Math.abs(length - wanted) < 2 * reach)
    .sort((a, b) => Math.abs(a.length - wanted) - Math.abs(b.length - wanted))
  const [best] = near
  return best
    ? { length: toTenth(best.length), reason: best.reason }
    : { length: Math.max(step, toStep(wanted)), reason: '' }
}

/** Least cover (mm) of the spirals that stay where they are; the usual one when there is none. */
function findStatedCover(others: readonly Spiral[], outline: Outline): number {
  const covers = others
    .map((other) => computeClearance(outline, other.centre) - (other.diameter + other.barDiameter) / 2)
    .filter((cover) => cover > 0)
  return covers.length === 0 ? usualCover : toTenth(Math.min(...covers))
}

/** A zero of a function of the way along a line (mm), within reach of 0; regula falsi after a bracket. */
function findZero(f: (t: number) => number, reach: number): number | null {
  let [a, b] = [-reach, reach]
  let [fa, fb] = [f(a), f(b)]
  if (fa * fb > 0) return null
  for (let i = 0; i < 60 && b - a > 1e-3; i++) {
    const t = (a + b) / 2
    const ft = f(t)
    if (fa * ft <= 0) [b, fb] = [t, ft]
    else [a, fa] = [t, ft]
  }
  return fa === fb ? a : (a * fb - b * fa) / (fb - fa)
}

function shift([x, y]: Point, [dx, dy]: Direction, t: number): Point {
  return [x + t * dx, y + t * dy]
}

function measure(a: Point, b: Point): number {
  return Math.hypot(a[0] - b[0], a[1] - b[1])
}

export function toStep(value: number): number {
  return Math.round(value / step) * step + 0
}

function toTenths([x, y]: Point): Point {
  return [toTenth(x), toTenth(y)]
}

function toTenth(value: number): number {
  return Math.round(value * 10) / 10 + 0
}
