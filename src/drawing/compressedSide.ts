/** The arrow onto the compressed side, with its words. px, y down. */
import type { Outline, Point } from '#shared/document/analysisDocument.ts'
import {
  computeClearance,
  computeExtent,
  computeOutlineBounds,
  computeOutlineCentroid,
} from '#shared/geometry/outline.ts'
import { createHead } from './dimensionLines.ts'
import { createTextBox, createUprightTextBox, type Anchor, type Box } from './textBox.ts'
import type { ViewTransform } from './viewTransform.ts'

export interface CompressedArrow {
  shank: string
  head: string
  text: string
  textX: number
  textY: number
  anchor: Anchor
  upright: boolean
  boxes: Box[]
}

const words = 'compressed side'
const textSize = 12
const gap = 4
const length = 32
const headLength = 12
const headHalfWidth = 4.5

/** Unit vectors of bending (y up): v towards the compressed side, u turned 90 degrees clockwise from it. */
export function computeDirections(angle: number): { v: Point; u: Point } {
  const radians = (angle * Math.PI) / 180
  return { v: [-Math.sin(radians), Math.cos(radians)], u: [Math.cos(radians), Math.sin(radians)] }
}

/** `side`: on which half of the face it stands, -1 the half that lies left when the compressed side is on top. */
export function createCompressedArrow(
  outline: Outline,
  view: ViewTransform,
  angle: number,
  side: 1 | -1,
): CompressedArrow {
  const { v, u } = computeDirections(angle)
  const [ox, oy] = computeOutlineCentroid(outline)
  const across = computeExtent(outline, u[0], u[1])
  // Beside the centre lines where the face is level or upright; on the corner where the direction is diagonal.
  const askew = Math.abs(angle / 90 - Math.round(angle / 90)) * 90
  const aside = 0.25 * side * (across.greatest - across.least) * Math.max(0, 1 - askew / 20)
  const face = findFace(outline, [ox + aside * u[0], oy + aside * u[1]], v)
  const [dx, dy] = [v[0], -v[1]]
  const tip: Point = [view.x(face[0]) + gap * dx, view.y(face[1]) + gap * dy]
  const tail: Point = [tip[0] + length * dx, tip[1] + length * dy]
  const neck: Point = [tip[0] + (headLength - 1) * dx, tip[1] + (headLength - 1) * dy]
  const bounds = computeOutlineBounds(outline)
  const label = placeWords(
    tip,
    tail,
    v,
    [side * u[0], -side * u[1]],
    [view.y(bounds.maxY), view.y(bounds.minY)],
  )
  return {
    shank: `M${tail[0]} ${tail[1]}L${neck[0]} ${neck[1]}`,
    head: createHead(tip[0], tip[1], -dx, -dy, headLength, headHalfWidth),
    text: words,
    ...label,
    boxes: [
      {
        left: Math.min(tip[0], tail[0]) - 5,
        right: Math.max(tip[0], tail[0]) + 5,
        top: Math.min(tip[1], tail[1]) - 5,
        bottom: Math.max(tip[1], tail[1]) + 5,
      },
      label.upright
        ? createUprightTextBox(words, label.textX, label.textY, textSize, 'text')
        : createTextBox(words, label.textX, label.textY, textSize, 'text', label.anchor),
    ],
  }
}

/** `away`: from the middle of the face to where the arrow stands, y down; then the section's top and bottom. */
function placeWords(
  tip: Point,
  tail: Point,
  [vx, vy]: Point,
  away: Point,
  [top, bottom]: Point,
): { textX: number; textY: number; anchor: Anchor; upright: boolean } {
  const middle: Point = [(tip[0] + tail[0]) / 2, (tip[1] + tail[1]) / 2]
  // Round faces fall back away from the middle: there is the room.
  if (Math.abs(vy) <= 0.5) {
    return {
      textX: middle[0] + 4,
      textY: middle[1] + 56 * Math.sign(away[1]),
      anchor: 'middle',
      upright: true,
    }
  }
  if (Math.abs(vx) <= 0.5) {
    // Below the section the extension lines stand outwards, so the words go towards the middle.
    const right = vy > 0 ? away[0] > 0 : away[0] < 0
    return {
      textX: middle[0] + (right ? 9 : -9),
      textY: vy > 0 ? Math.min(middle[1], top - 8) : Math.max(middle[1] + 6, bottom + 17),
      anchor: right ? 'start' : 'end',
      upright: false,
    }
  }
  return {
    textX: tail[0] + (vx < 0 ? 8 : -8),
    textY: tail[1] + (vy > 0 ? 0 : 9),
    anchor: vx < 0 ? 'start' : 'end',
    upright: false,
  }
}

/**
 * The outermost point of the outline on the line through a point along the unit vector v. From outside, every step goes as
 * far as the outline is away, so it never passes the face. A line that misses the outline ends at its lowest place.
 */
export function findFace(outline: Outline, from: Point, [vx, vy]: Point): Point {
  const { least, greatest } = computeExtent(outline, vx, vy)
  const start = from[0] * vx + from[1] * vy
  const at = (t: number): Point => [from[0] + (t - start) * vx, from[1] + (t - start) * vy]
  let t = greatest + 1
  for (let i = 0; i < 200 && t > least; i++) {
    const away = -computeClearance(outline, at(t))
    if (away < 1e-9) break
    t -= away
  }
  return at(t)
}
