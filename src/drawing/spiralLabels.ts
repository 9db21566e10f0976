/**
 * Where the names of spirals stand: inside their own wire, clear of bars, wires and one another. A spiral alone of its
 * make that has the room carries its size beside the name. Places are offsets from the centre, so that a name goes with
 * its spiral while it is dragged.
 */
import type { Section, Spiral } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { computeOutlineCentroid } from '#shared/geometry/outline.ts'
import { groupAlike } from '@/editing/spiralGroups.ts'
import { computeBarRadius, computeWireWidth } from './grips.ts'
import { formatSize } from './size.ts'
import { writeSpiralSize } from './partWords.ts'
import { doBoxesMeet, estimateTextWidth, measureToBox, measureToFarCorner, type Box } from './textBox.ts'
import type { ViewTransform } from './viewTransform.ts'

export interface SpiralLabel {
  id: string
  /** Middle of the balloon, px. */
  x: number
  y: number
  /** Half of the balloon's width; its height is 22. */
  half: number
  /** Size beside the name; empty: the name alone. */
  lines: string[]
  box: Box
}

/** Offset (px) of a balloon from the centre of its spiral while that had the radius (px). */
interface LabelOffset {
  dx: number
  dy: number
  radius: number
  lines: string[]
}

/** By spiral; held while something is dragged. */
export type LabelOffsets = ReadonlyMap<string, LabelOffset>

export const balloonRadius = 11
const textSize = 12
const lineHeight = 17
const padding = 6
/** A size beside the name must stand clear; a name alone takes the least bad place. */
const clearCost = 300

export function computeLabelOffsets(section: Section, view: ViewTransform): LabelOffsets {
  const alone = new Set(
    groupAlike(section.spirals).flatMap(({ members }) => (members.length === 1 ? [members[0].id] : [])),
  )
  const offsets = new Map<string, LabelOffset>()
  const taken: Box[] = []
  for (const spiral of section.spirals) {
    const [size, ...rest] = writeSpiralSize(spiral).split(', ')
    const lines = alone.has(spiral.id) ? [size, rest.join(', ')] : []
    const whole = lines.length > 0 ? findPlace(section, spiral, view, lines, taken) : null
    const place =
      whole && whole.cost < clearCost
        ? { ...whole, lines }
        : { ...findPlace(section, spiral, view, [], taken), lines: [] }
    const radius = (spiral.diameter / 2) * view.scale
    offsets.set(spiral.id, { dx: place.dx, dy: place.dy, radius, lines: place.lines })
    taken.push(createBox(spiral, view, place.dx, place.dy, place.lines))
  }
  return offsets
}

export function placeSpiralLabels(
  section: Section,
  view: ViewTransform,
  offsets: LabelOffsets,
): SpiralLabel[] {
  return section.spirals.flatMap((spiral) => {
    const offset = offsets.get(spiral.id)
    if (!offset) return []
    // A spiral that grows or shrinks takes its name along.
    const growth = offset.radius > 0 ? ((spiral.diameter / 2) * view.scale) / offset.radius : 1
    const [dx, dy] = [offset.dx * growth, offset.dy * growth]
    const lines = offset.lines.length === 0 ? [] : splitSize(spiral)
    return [
      {
        id: spiral.id,
        x: view.x(spiral.centre[0]) + dx,
        y: view.y(spiral.centre[1]) + dy,
        half: measureHalf(spiral.id),
        lines,
        box: createBox(spiral, view, dx, dy, lines),
      },
    ]
  })
}

function splitSize(spiral: Spiral): string[] {
  const [size, ...rest] = writeSpiralSize(spiral).split(', ')
  return [size, rest.join(', ')]
}

function measureHalf(id: string): number {
  return Math.max(balloonRadius, estimateTextWidth(id, 10.5, 'text') / 2 + 5)
}

/** Balloon, and to its right the lines. */
function createBox(
  spiral: Spiral,
  view: ViewTransform,
  dx: number,
  dy: number,
  lines: readonly string[],
): Box {
  const x = view.x(spiral.centre[0]) + dx
  const y = view.y(spiral.centre[1]) + dy
  const half = measureHalf(spiral.id)
  const text = Math.max(0, ...lines.map((line) => estimateTextWidth(line, textSize, 'text') + padding))
  const high = Math.max(balloonRadius, (lines.length * lineHeight) / 2)
  return { left: x - half, right: x + half + text, top: y - high, bottom: y + high }
}

function findPlace(
  section: Section,
  spiral: Spiral,
  view: ViewTransform,
  lines: readonly string[],
  taken: readonly Box[],
): { dx: number; dy: number; cost: number } {
  const radius = (spiral.diameter / 2) * view.scale
  const reach = radius - 4
  const stepSize = radius > 90 ? 10 : 5
  const count = Math.max(1, Math.floor(reach / stepSize))
  const wanted = computeWanted(section, spiral, radius, lines.length > 0)
  const measure = createMeasure(section, spiral, view, taken)
  let best = { dx: 0, dy: 0, cost: Infinity }
  for (let i = -count; i <= count; i++) {
    for (let k = -count; k <= count; k++) {
      const [dx, dy] = [i * stepSize, k * stepSize]
      if (Math.hypot(dx, dy) > reach) continue
      const far = Math.hypot(dx - wanted.dx, dy - wanted.dy) * 0.6
      if (far >= best.cost) continue
      const cost = far + measure(createBox(spiral, view, dx, dy, lines))
      if (cost < best.cost) best = { dx, dy, cost }
    }
  }
  return best
}

/** Small names stand outwards, away from the middle of the section; a size stands left below its centre. */
function computeWanted(
  section: Section,
  spiral: Spiral,
  radius: number,
  sized: boolean,
): { dx: number; dy: number } {
  if (sized) return { dx: -0.3 * radius, dy: 0.13 * radius }
  const [ox, oy] = computeOutlineCentroid(section.outline)
  const [x, y] = [spiral.centre[0] - ox, spiral.centre[1] - oy]
  const far = Math.hypot(x, y)
  const off = 0.42 * radius
  return far < 1 ? { dx: -0.3 * radius, dy: 0.3 * radius } : { dx: (off * x) / far, dy: (-off * y) / far }
}

/** What a box covers that it should not. */
function createMeasure(section: Section, spiral: Spiral, view: ViewTransform, taken: readonly Box[]) {
  const bars = placeBars(section.bars).map((bar) => ({
    x: view.x(bar.x),
    y: view.y(bar.y),
    radius: computeBarRadius(bar.diameter, view) + 2,
  }))
  const wires = section.spirals.map((one) => ({
    x: view.x(one.centre[0]),
    y: view.y(one.centre[1]),
    radius: (one.diameter / 2) * view.scale,
    half: computeWireWidth(one.barDiameter, view) / 2 + 2,
  }))
  const voids = section.voids.map((hole) => ({
    x: view.x(hole.centre[0]),
    y: view.y(hole.centre[1]),
    radius: (hole.diameter / 2) * view.scale + 2,
  }))
  const cx = view.x(spiral.centre[0])
  const cy = view.y(spiral.centre[1])
  const own = (spiral.diameter / 2) * view.scale
  return (box: Box): number => {
    let cost = 0
    if (measureToFarCorner(cx, cy, box) > own - 3) cost += 400
    for (const bar of bars) if (measureToBox(bar.x, bar.y, box) < bar.radius) cost += 200
    for (const hole of voids) if (measureToBox(hole.x, hole.y, box) < hole.radius) cost += 400
    for (const wire of wires) {
      const near = measureToBox(wire.x, wire.y, box)
      const far = measureToFarCorner(wire.x, wire.y, box)
      if (near < wire.radius + wire.half && far > wire.radius - wire.half) cost += 150
      // The crossing of the centre lines, where the handle stands.
      if (near < 10) cost += 60
    }
    for (const other of taken) if (doBoxesMeet(other, box, 3)) cost += 400
    if (box.left < cx && box.right > cx) cost += 8
    if (box.top < cy && box.bottom > cy) cost += 8
    return cost
  }
}

/** Void Ø600, written in its middle where there is room. */
export function writeVoid(diameter: number, lined: boolean): string {
  return `${lined ? 'lined void' : 'void'} Ø${formatSize(diameter)}`
}
