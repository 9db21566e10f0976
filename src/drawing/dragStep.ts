/** One step of a drag: always from the section as it was when the drag began, so that nothing accumulates. mm. */
import type { Point, Section } from '#shared/document/analysisDocument.ts'
import { moveBars } from './edits/moveBars.ts'
import { moveSpiral } from './edits/moveSpiral.ts'
import { findOwner } from './edits/ownRings.ts'
import { resizeRing } from './edits/resizeRing.ts'
import { resizeSpiral } from './edits/resizeSpiral.ts'
import { findRingPartners } from './edits/ringPartners.ts'
import { turnRing } from './edits/turnRing.ts'
import { findMirrorPartners } from './mirrorPartners.ts'
import type { Grip } from './selection.ts'
import { snapCentre, snapRingDiameter, snapSpiralDiameter, snapStartAngle, toStep } from './snapping.ts'

export interface Drag {
  before: Section
  grip: Grip
  /** Where the pointer went down, and where it is. */
  from: Point
  to: Point
  /** How near (mm) a snap catches. */
  reach: number
  /** The part alone, without those that are kept alike with it. */
  alone: boolean
  /** No snaps: to 0.1 mm. */
  free: boolean
  /** A ring turns instead of growing. */
  turn: boolean
}

export interface DragStep {
  section: Section
  /** Why the part rests where it does. */
  reason: string
}

export function computeDragStep(drag: Drag): DragStep {
  switch (drag.grip.kind) {
    case 'move-spiral':
      return stepMove(drag, drag.grip.id)
    case 'resize-spiral':
      return stepResize(drag, drag.grip.id)
    case 'ring':
      return stepRing(drag, drag.grip.group)
    case 'bars':
      return stepBars(drag, drag.grip.group)
  }
}

function stepMove({ before, from, to, reach, alone, free }: Drag, id: string): DragStep {
  const spiral = before.spirals.find((one) => one.id === id)
  if (!spiral) return { section: before, reason: '' }
  const partners = alone ? [] : findMirrorPartners(before.spirals, id)
  const wanted: Point = [spiral.centre[0] + to[0] - from[0], spiral.centre[1] + to[1] - from[1]]
  const moving = partners.map((partner) => partner.id)
  const { point, reason } = snapCentre(wanted, spiral, { section: before, moving, reach, free })
  return { section: moveSpiral(before, id, point, partners), reason }
}

function stepResize({ before, from, to, reach, alone, free }: Drag, id: string): DragStep {
  const spiral = before.spirals.find((one) => one.id === id)
  if (!spiral) return { section: before, reason: '' }
  const partners = alone ? [] : findMirrorPartners(before.spirals, id)
  const wanted = spiral.diameter + 2 * measureGrowth(spiral.centre, from, to)
  const moving = partners.map((partner) => partner.id)
  const { length, reason } = snapSpiralDiameter(wanted, spiral, { section: before, moving, reach, free })
  return { section: resizeSpiral(before, id, length, partners), reason }
}

function stepRing({ before, from, to, reach, alone, free, turn }: Drag, group: number): DragStep {
  const ring = before.bars[group]
  if (ring?.layout.kind !== 'ring') return { section: before, reason: '' }
  const partners = alone ? [] : findRingPartners(before, group)
  const { centre, diameter, startAngle, count } = ring.layout
  if (turn) {
    const swept =
      Math.atan2(to[1] - centre[1], to[0] - centre[0]) - Math.atan2(from[1] - centre[1], from[0] - centre[0])
    const { angle, reason } = snapStartAngle(startAngle + (swept * 180) / Math.PI, count, free)
    return { section: turnRing(before, group, angle - startAngle, partners), reason: reason || 'turning' }
  }
  const wanted = diameter + 2 * measureGrowth(centre, from, to)
  const context = { section: before, moving: [], reach, free }
  const { length, reason } = snapRingDiameter(wanted, ring.barDiameter, findOwner(before, group), context)
  return { section: resizeRing(before, group, length, partners), reason }
}

function stepBars({ before, from, to, free }: Drag, group: number): DragStep {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  return free
    ? { section: moveBars(before, group, dx, dy), reason: 'free of snaps' }
    : { section: moveBars(before, group, toStep(dx), toStep(dy)), reason: '' }
}

/** How much farther from the centre the pointer is now. */
function measureGrowth(centre: Point, from: Point, to: Point): number {
  return (
    Math.hypot(to[0] - centre[0], to[1] - centre[1]) - Math.hypot(from[0] - centre[0], from[1] - centre[1])
  )
}
