/**
 * Dimension lines in pixels, y down: closed arrowheads, extension lines clear of the object, the number above a level
 * line and read from the right on an upright one. Where a line is too short for its heads, they stand outside and point in.
 */
import {
  createTextBox,
  createUprightTextBox,
  doBoxesMeet,
  estimateTextWidth,
  type Anchor,
  type Box,
} from './textBox.ts'

export interface DimensionLine {
  key: string
  line: string
  /** Closed heads, filled. */
  heads: string
  extensions: string
  text: string
  textX: number
  textY: number
  anchor: Anchor
  upright: boolean
  /** Said of the number, under the line. */
  word?: { text: string; x: number; y: number }
  /** What the number covers. */
  box: Box
  /** What the line and its heads cover. */
  span: Box
  /** Places the number may take instead, best first. */
  others: NumberPlace[]
  tone: DimensionTone
}

export type DimensionTone = 'plain' | 'selected' | 'fault'

interface NumberPlace {
  x: number
  y: number
  anchor: Anchor
}

/** px, as drawn at 100 % */
export const headLength = 8
const headHalfWidth = 2.3
/** Under this length the heads stand outside. */
export const shortLength = 24
const outsideRun = 16
const overshoot = 4
const gap = 4
const lift = 4
export const numberSize = 12

interface DimensionOptions {
  tone?: DimensionTone
  /** Extension lines start here (edge of the object) and run to the line; absent: none. */
  from?: number
}

/** A level dimension from x1 to x2 (left to right) at the height y. */
export function createLevelDimension(
  key: string,
  x1: number,
  x2: number,
  y: number,
  text: string,
  { tone = 'plain', from }: DimensionOptions = {},
): DimensionLine {
  const inside = x2 - x1 >= shortLength
  const reach = inside ? 2 : outsideRun
  const middle = (x1 + x2) / 2
  const fits = inside && estimateTextWidth(text, numberSize, 'number') <= x2 - x1 - 4
  const beside = x2 + (inside ? 6 : outsideRun + 4)
  const before = x1 - (inside ? 6 : outsideRun + 4)
  const above: NumberPlace = { x: middle, y: y - lift, anchor: 'middle' }
  const right: NumberPlace = { x: beside, y: y + 4, anchor: 'start' }
  const left: NumberPlace = { x: before, y: y + 4, anchor: 'end' }
  const below: NumberPlace = { x: middle, y: y + 14, anchor: 'middle' }
  const higher: NumberPlace = { x: middle, y: y - lift - 13, anchor: 'middle' }
  const [place, ...others] = fits ? [above, below, right, left, higher] : [right, left, higher, below]
  return {
    key,
    line: inside ? `M${x1} ${y}H${x2}` : `M${x1 - outsideRun} ${y}H${x1}M${x2} ${y}H${x2 + outsideRun}`,
    heads: inside
      ? createHead(x1, y, -1, 0) + createHead(x2, y, 1, 0)
      : createHead(x1, y, 1, 0) + createHead(x2, y, -1, 0),
    extensions: from === undefined ? '' : writeLevelExtensions(x1, x2, y, from),
    text,
    textX: place.x,
    textY: place.y,
    anchor: place.anchor,
    upright: false,
    box: createTextBox(text, place.x, place.y, numberSize, 'number', place.anchor),
    span: { left: x1 - reach, right: x2 + reach, top: y - 4, bottom: y + 4 },
    others,
    tone,
  }
}

/** An upright dimension from y1 (upper) to y2 at x. */
export function createUprightDimension(
  key: string,
  y1: number,
  y2: number,
  x: number,
  text: string,
  { tone = 'plain', from }: DimensionOptions = {},
): DimensionLine {
  const inside = y2 - y1 >= shortLength
  const reach = inside ? 2 : outsideRun
  const middle = (y1 + y2) / 2
  const half = estimateTextWidth(text, numberSize, 'number') / 2
  const fits = inside && 2 * half <= y2 - y1 - 4
  const run = inside ? 6 : outsideRun + 4
  const centred: NumberPlace = { x: x - lift, y: middle, anchor: 'middle' }
  const under: NumberPlace = { x: x + 4, y: y2 + run + half, anchor: 'middle' }
  const over: NumberPlace = { x: x + 4, y: y1 - run - half, anchor: 'middle' }
  const across: NumberPlace = { x: x + 13, y: middle, anchor: 'middle' }
  const farther: NumberPlace = { x: x - lift - 13, y: middle, anchor: 'middle' }
  const [place, ...others] = fits ? [centred, across, under, over, farther] : [over, under, farther, across]
  return {
    key,
    line: inside ? `M${x} ${y1}V${y2}` : `M${x} ${y1 - outsideRun}V${y1}M${x} ${y2}V${y2 + outsideRun}`,
    heads: inside
      ? createHead(x, y1, 0, -1) + createHead(x, y2, 0, 1)
      : createHead(x, y1, 0, 1) + createHead(x, y2, 0, -1),
    extensions: from === undefined ? '' : writeUprightExtensions(y1, y2, x, from),
    text,
    textX: place.x,
    textY: place.y,
    anchor: place.anchor,
    upright: true,
    box: createUprightTextBox(text, place.x, place.y, numberSize, 'number'),
    span: { left: x - 4, right: x + 4, top: y1 - reach, bottom: y2 + reach },
    others,
    tone,
  }
}

/** A closed head with its tip at (x, y), pointing along the unit vector (ux, uy). */
export function createHead(
  x: number,
  y: number,
  ux: number,
  uy: number,
  length = headLength,
  halfWidth = headHalfWidth,
): string {
  const [bx, by] = [x - length * ux, y - length * uy]
  return (
    `M${write(x)} ${write(y)}L${write(bx - halfWidth * uy)} ${write(by + halfWidth * ux)}` +
    `L${write(bx + halfWidth * uy)} ${write(by - halfWidth * ux)}Z`
  )
}

/**
 * Moves numbers that would lie on another number, or on one of the `taken` boxes, to the next best place at their line.
 * Earlier lines keep their places; a number with no clear place at all stays where it is.
 */
export function keepNumbersClear(
  lines: readonly DimensionLine[],
  taken: readonly Box[] = [],
): DimensionLine[] {
  const boxes = [...taken]
  return lines.map((line) => {
    const placed = isClear(line.box, boxes) ? line : (findClearPlace(line, boxes) ?? line)
    boxes.push(placed.box)
    return placed
  })
}

function findClearPlace(line: DimensionLine, boxes: readonly Box[]): DimensionLine | undefined {
  for (const { x, y, anchor } of line.others) {
    const box = line.upright
      ? createUprightTextBox(line.text, x, y, numberSize, 'number')
      : createTextBox(line.text, x, y, numberSize, 'number', anchor)
    if (isClear(box, boxes)) return { ...line, textX: x, textY: y, anchor, box }
  }
  return undefined
}

function isClear(box: Box, boxes: readonly Box[]): boolean {
  return !boxes.some((other) => doBoxesMeet(box, other, 2))
}

function writeLevelExtensions(x1: number, x2: number, y: number, from: number): string {
  const side = y >= from ? 1 : -1
  return [x1, x2].map((x) => `M${x} ${from + side * gap}V${y + side * overshoot}`).join('')
}

function writeUprightExtensions(y1: number, y2: number, x: number, from: number): string {
  const side = x >= from ? 1 : -1
  return [y1, y2].map((y) => `M${from + side * gap} ${y}H${x + side * overshoot}`).join('')
}

function write(value: number): number {
  return Math.round(value * 100) / 100
}
