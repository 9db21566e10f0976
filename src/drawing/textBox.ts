/**
 * Boxes of what is written on the drawing, px, y down, so that numbers, names and leaders keep clear of one another.
 * Widths are estimated from the advance widths of Roboto and Roboto Mono; a box may be a few pixels wide of its text.
 */
export interface Box {
  left: number
  top: number
  right: number
  bottom: number
}

export type Anchor = 'start' | 'middle' | 'end'
export type Face = 'text' | 'number'

/** Advance of every character of Roboto Mono, em. */
const monoAdvance = 0.6
/** Advances of Roboto by kind of character, em (rounded up from the advance widths of the regular face). */
const textAdvances: [RegExp, number][] = [
  [/[0-9+=×–]/, 0.57],
  [/\s/, 0.25],
  [/[ijlI.,:;'′|!()]/, 0.29],
  [/[frt-]/, 0.35],
  [/[mwMW]/, 0.87],
  [/[A-ZØ]/, 0.66],
]
const usualAdvance = 0.54
/** Height above and below the baseline, em. */
const ascent = 0.78
const descent = 0.22

export function estimateTextWidth(text: string, size: number, face: Face): number {
  if (face === 'number') return text.length * size * monoAdvance
  let width = 0
  for (const sign of text) width += textAdvances.find(([kind]) => kind.test(sign))?.[1] ?? usualAdvance
  return width * size
}

/** The box of a line of text whose baseline starts, is centred or ends at x. */
export function createTextBox(
  text: string,
  x: number,
  baseline: number,
  size: number,
  face: Face,
  anchor: Anchor,
): Box {
  const width = estimateTextWidth(text, size, face)
  const left = anchor === 'start' ? x : anchor === 'middle' ? x - width / 2 : x - width
  return { left, right: left + width, top: baseline - ascent * size, bottom: baseline + descent * size }
}

/** The same for text that runs upwards, its baseline upright at x and its middle at y. */
export function createUprightTextBox(text: string, x: number, y: number, size: number, face: Face): Box {
  const width = estimateTextWidth(text, size, face)
  return { left: x - ascent * size, right: x + descent * size, top: y - width / 2, bottom: y + width / 2 }
}

/** Boxes nearer than `gap` px count as meeting. */
export function doBoxesMeet(a: Box, b: Box, gap = 0): boolean {
  return a.left < b.right + gap && b.left < a.right + gap && a.top < b.bottom + gap && b.top < a.bottom + gap
}

export function joinBoxes(boxes: readonly Box[]): Box {
  return {
    left: Math.min(...boxes.map((box) => box.left)),
    top: Math.min(...boxes.map((box) => box.top)),
    right: Math.max(...boxes.map((box) => box.right)),
    bottom: Math.max(...boxes.map((box) => box.bottom)),
  }
}

/** Whether a straight line from (x1, y1) to (x2, y2) runs through the box (clipping by Liang and Barsky). */
export function doesLineMeetBox(x1: number, y1: number, x2: number, y2: number, box: Box): boolean {
  const dx = x2 - x1
  const dy = y2 - y1
  let enter = 0
  let leave = 1
  for (const [run, room] of [
    [-dx, x1 - box.left],
    [dx, box.right - x1],
    [-dy, y1 - box.top],
    [dy, box.bottom - y1],
  ]) {
    if (run === 0) {
      if (room < 0) return false
    } else if (run < 0) {
      enter = Math.max(enter, room / run)
    } else {
      leave = Math.min(leave, room / run)
    }
  }
  return enter <= leave
}

/** Distance (px) from a point to the box; 0 inside. */
export function measureToBox(x: number, y: number, box: Box): number {
  return Math.hypot(Math.max(box.left - x, 0, x - box.right), Math.max(box.top - y, 0, y - box.bottom))
}

/** Distance (px) from a point to the farthest corner of the box. */
export function measureToFarCorner(x: number, y: number, box: Box): number {
  return Math.hypot(
    Math.max(Math.abs(x - box.left), Math.abs(x - box.right)),
    Math.max(Math.abs(y - box.top), Math.abs(y - box.bottom)),
  )
}
