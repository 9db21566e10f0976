/**
 * Words outside the section with a leader to what they are about. Each takes the cheapest of the free places: short leaders
 * that cross little come first. A place once taken is held while something is dragged. px, y down.
 */
import { doBoxesMeet, doesLineMeetBox, type Box } from './textBox.ts'

export type Target =
  /** A circle, met from outside with an arrowhead. */
  | { kind: 'edge'; x: number; y: number; radius: number }
  /** A place in an area, marked by a dot. */
  | { kind: 'dot'; x: number; y: number }

export interface CalloutRequest {
  key: string
  width: number
  height: number
  targets: Target[]
}

/** Where words may stand: the corner of their box, and on which side of it the leader comes in. */
export interface Slot {
  left: number
  top: number
  side: 'left' | 'right'
}

export interface Callout {
  key: string
  box: Box
  slot: Slot
  /** Which target, so that it is kept while dragging. */
  target: number
  /** Angle (radians) on the target's edge at which the leader ends. */
  turn: number
  leader: string
  end: { kind: 'edge' | 'dot'; x: number; y: number; ux: number; uy: number }
}

export interface CalloutObstacles {
  /** Words that neither words nor leaders may lie on. */
  boxes: Box[]
  /** Where no words may stand; leaders may cross. */
  areas: Box[]
  /** Circles that a leader should not run through: bars. */
  bars: { x: number; y: number; radius: number }[]
}

/** Level run of a leader before it bends, px. */
const shoulder = 10
/** From the leader to the words. */
const space = 6
/** Height of the leader under the top of the words: the middle of the first line. */
export const firstLine = 8
const turns = [0, 0.35, -0.35, 0.7, -0.7]

/** Held places by key. */
export type HeldCallouts = ReadonlyMap<string, Callout>

export function placeCallouts(
  requests: readonly CalloutRequest[],
  slots: readonly Slot[],
  room: Box,
  obstacles: CalloutObstacles,
  held: HeldCallouts = new Map(),
): Callout[] {
  const placed: Callout[] = []
  const taken = [...obstacles.boxes]
  for (const request of requests) {
    const earlier = held.get(request.key)
    const callout = earlier
      ? keep(request, earlier)
      : findBest(request, slots, room, { ...obstacles, boxes: taken }, placed)
    if (!callout) continue
    placed.push(callout)
    taken.push(callout.box)
  }
  return placed
}

function keep(request: CalloutRequest, { slot, target, turn }: Callout): Callout | null {
  const aim = request.targets[target]
  return aim ? draw(request, slot, target, aim, turn) : null
}

function findBest(
  request: CalloutRequest,
  slots: readonly Slot[],
  room: Box,
  obstacles: CalloutObstacles,
  placed: readonly Callout[],
): Callout | null {
  let best: { slot: Slot; target: number; turn: number; cost: number } | null = null
  for (const slot of slots) {
    const box = createBox(request, slot)
    if (box.left < room.left || box.right > room.right || box.top < room.top || box.bottom > room.bottom)
      continue
    if (obstacles.boxes.some((other) => doBoxesMeet(other, box, 5))) continue
    if (obstacles.areas.some((area) => doBoxesMeet(area, box))) continue
    const bend = findBend(slot, box)
    request.targets.forEach((aim, target) => {
      for (const turn of aim.kind === 'edge' ? turns : [0]) {
        const limit = best?.cost ?? Infinity
        const end = findEnd(bend, aim, turn)
        const cost = measure(bend, end, slot.side, obstacles, placed, limit) + 6 * Math.abs(turn)
        if (cost < limit) best = { slot, target, turn, cost }
      }
    })
  }
  const found = best as { slot: Slot; target: number; turn: number } | null
  return found && draw(request, found.slot, found.target, request.targets[found.target], found.turn)
}

/** Length and slope of the leader, and what it crosses. */
function measure(
  bend: Place,
  { x, y }: Place,
  side: Slot['side'],
  obstacles: CalloutObstacles,
  placed: readonly Callout[],
  limit: number,
): number {
  const [dx, dy] = [x - bend.x, y - bend.y]
  const length = Math.hypot(dx, dy)
  const slope = (Math.atan2(Math.abs(dy), Math.abs(dx)) * 180) / Math.PI
  let cost = length + 0.6 * Math.abs(slope - 45)
  // A leader that turns back under its own words.
  if (side === 'left' ? dx > -4 : dx < 4) cost += 500
  if (cost >= limit) return cost
  for (const box of obstacles.boxes) if (doesLineMeetBox(bend.x, bend.y, x, y, box)) cost += 120
  for (const bar of obstacles.bars) {
    if (measureToLine(bar.x, bar.y, bend.x, bend.y, x, y) < bar.radius + 1.5) cost += 45
  }
  for (const other of placed) {
    const from = findBend(other.slot, other.box)
    if (doCross(bend.x, bend.y, x, y, from.x, from.y, other.end.x, other.end.y)) cost += 200
    if (doesLineMeetBox(bend.x, bend.y, x, y, other.box)) cost += 300
  }
  return cost
}

function draw(request: CalloutRequest, slot: Slot, target: number, aim: Target, turn: number): Callout {
  const box = createBox(request, slot)
  const bend = findBend(slot, box)
  const start = slot.side === 'left' ? box.left - space : box.right + space
  const { x, y } = findEnd(bend, aim, turn)
  const length = Math.hypot(x - bend.x, y - bend.y) || 1
  return {
    key: request.key,
    box,
    slot,
    target,
    turn,
    leader: `M${write(start)} ${write(bend.y)}H${write(bend.x)}L${write(x)} ${write(y)}`,
    end: { kind: aim.kind, x, y, ux: (x - bend.x) / length, uy: (y - bend.y) / length },
  }
}

interface Place {
  x: number
  y: number
}

/** On the edge towards the bend, turned by so much; in an area the place itself. */
function findEnd(bend: Place, aim: Target, turn: number): Place {
  if (aim.kind === 'dot') return aim
  const angle = Math.atan2(bend.y - aim.y, bend.x - aim.x) + turn
  return { x: aim.x + aim.radius * Math.cos(angle), y: aim.y + aim.radius * Math.sin(angle) }
}

function createBox({ width, height }: CalloutRequest, { left, top }: Slot): Box {
  return { left, top, right: left + width, bottom: top + height }
}

function findBend({ side }: Slot, box: Box): Place {
  return {
    x: side === 'left' ? box.left - space - shoulder : box.right + space + shoulder,
    y: box.top + firstLine,
  }
}

function measureToLine(px: number, py: number, x1: number, y1: number, x2: number, y2: number): number {
  const [dx, dy] = [x2 - x1, y2 - y1]
  const squared = dx * dx + dy * dy
  const t = squared === 0 ? 0 : Math.min(1, Math.max(0, ((px - x1) * dx + (py - y1) * dy) / squared))
  return Math.hypot(px - x1 - t * dx, py - y1 - t * dy)
}

function doCross(
  ax: number,
  ay: number,
  bx: number,
  by: number,
  cx: number,
  cy: number,
  dx: number,
  dy: number,
): boolean {
  const side = (x: number, y: number, x1: number, y1: number, x2: number, y2: number) =>
    Math.sign((x2 - x1) * (y - y1) - (y2 - y1) * (x - x1))
  return (
    side(ax, ay, cx, cy, dx, dy) !== side(bx, by, cx, cy, dx, dy) &&
    side(cx, cy, ax, ay, bx, by) !== side(dx, dy, ax, ay, bx, by)
  )
}

function write(value: number): number {
  return Math.round(value * 10) / 10
}
