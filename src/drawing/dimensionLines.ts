/** Dimension lines round a section, in pixels: arrowheads closed, the number above the line or beside it when it is short. */

export interface DimensionLine {
  key: string
  /** Line with its arrowheads. */
  path: string
  extensions: string
  text: string
  textX: number
  textY: number
  upright: boolean
}

const head = 8
const halfWidth = 2.3
/** Under this length the arrows stand outside and point in. */
const short = 24
const overshoot = 4
const gap = 4

/** A level dimension between x1 and x2 at the height y; extension lines come from `from` (the height of the object). */
export function createLevelDimension(
  key: string,
  x1: number,
  x2: number,
  y: number,
  from: number,
  text: string,
): DimensionLine {
  const inside = x2 - x1 >= short
  const end = y >= from ? overshoot : -overshoot
  const start = y >= from ? gap : -gap
  return {
    key,
    path: inside
      ? `M${x1} ${y}H${x2}${arrow(x1, y, 1)}${arrow(x2, y, -1)}`
      : `M${x1 - 2 * head} ${y}H${x1}M${x2} ${y}H${x2 + 2 * head}${arrow(x1, y, -1)}${arrow(x2, y, 1)}`,
    extensions: `M${x1} ${from + start}V${y + end}M${x2} ${from + start}V${y + end}`,
    text,
    textX: inside ? (x1 + x2) / 2 : x2 + 2 * head + 4,
    textY: y - 4,
    upright: false,
  }
}

/** An upright dimension between y1 (upper) and y2 at x; read from the right. */
export function createUprightDimension(
  key: string,
  y1: number,
  y2: number,
  x: number,
  from: number,
  text: string,
): DimensionLine {
  const end = x >= from ? overshoot : -overshoot
  const start = x >= from ? gap : -gap
  return {
    key,
    path: `M${x} ${y1}V${y2}${arrowUp(x, y1, 1)}${arrowUp(x, y2, -1)}`,
    extensions: `M${from + start} ${y1}H${x + end}M${from + start} ${y2}H${x + end}`,
    text,
    textX: x - 4,
    textY: (y1 + y2) / 2,
    upright: true,
  }
}

/** Head with its tip at x, pointing to -x for side 1. */
function arrow(x: number, y: number, side: 1 | -1): string {
  return `M${x} ${y}l${side * head} ${-halfWidth}v${2 * halfWidth}Z`
}

function arrowUp(x: number, y: number, side: 1 | -1): string {
  return `M${x} ${y}l${-halfWidth} ${side * head}h${2 * halfWidth}Z`
}

/** Sizes on a drawing have no thousands separators, and a decimal only where there is one. */
export function formatSize(mm: number): string {
  return String(Math.round(mm * 10) / 10)
}
