/** The neutral axis of a state across the section. px, y down. */
import type { Outline } from '#shared/document/analysisDocument.ts'
import { computeExtent, computeOutlineCentroid } from '#shared/geometry/outline.ts'
import { computeDirections } from './compressedSide.ts'
import { diagramWidth, type DrawingFrame } from './drawingFrame.ts'
import type { Anchor } from './textBox.ts'

export interface DrawnState {
  /** 1/mm */
  curvature: number
  /** at the centroid of the gross outline, compression positive */
  axialStrain: number
  label: string
}

export interface NeutralAxis {
  x1: number
  y1: number
  x2: number
  y2: number
  textX: number
  textY: number
  anchor: Anchor
}

const overhang = 16

/** Height (mm) of the neutral axis over the centroid towards the compressed side; null: none within the outline. */
export function findNeutralAxis(outline: Outline, angle: number, state: DrawnState): number | null {
  if (state.curvature === 0) return null
  const v = -state.axialStrain / state.curvature
  const { least, greatest } = measureAlong(outline, angle)
  return v > least && v < greatest ? v : null
}

/** Lowest and highest place of the outline (mm) along the direction of bending, from the centroid. */
export function measureAlong(outline: Outline, angle: number): { least: number; greatest: number } {
  const { v } = computeDirections(angle)
  const [ox, oy] = computeOutlineCentroid(outline)
  const off = ox * v[0] + oy * v[1]
  const { least, greatest } = computeExtent(outline, v[0], v[1])
  return { least: least - off, greatest: greatest - off }
}

/** Across the section and a little over it; where it is level, on through the strain diagram. */
export function createNeutralAxis(
  outline: Outline,
  frame: DrawingFrame,
  angle: number,
  height: number,
): NeutralAxis {
  const { v, u } = computeDirections(angle)
  const [ox, oy] = computeOutlineCentroid(outline)
  const { view } = frame
  const x = view.x(ox + height * v[0])
  const y = view.y(oy + height * v[1])
  if (Math.abs(v[1]) > 0.9999) {
    const right = frame.diagramLeft === null ? frame.right + overhang : frame.diagramLeft + diagramWidth - 34
    return {
      x1: frame.left - overhang,
      y1: y,
      x2: right,
      y2: y,
      textX: right + 5,
      textY: y + 4,
      anchor: 'start',
    }
  }
  const [dx, dy] = u[0] < -1e-9 || (Math.abs(u[0]) <= 1e-9 && u[1] < 0) ? [-u[0], u[1]] : [u[0], -u[1]]
  const back = clip(x, y, -dx, -dy, frame)
  const ahead = clip(x, y, dx, dy, frame)
  const [ex, ey] = [x + ahead * dx, y + ahead * dy]
  return {
    x1: x - back * dx,
    y1: y - back * dy,
    x2: ex,
    y2: ey,
    textX: ex + 7 * dx,
    textY: ey + 7 * dy + (dy < -0.5 ? 0 : dy > 0.5 ? 8 : 4),
    anchor: Math.abs(dx) < 0.4 ? 'middle' : 'start',
  }
}

/** How far (px) one can go along a direction within the section and its overhang. */
function clip(
  x: number,
  y: number,
  dx: number,
  dy: number,
  { left, right, top, bottom }: DrawingFrame,
): number {
  const tx = dx > 0 ? (right + overhang - x) / dx : dx < 0 ? (left - overhang - x) / dx : Infinity
  const ty = dy > 0 ? (bottom + overhang - y) / dy : dy < 0 ? (top - overhang - y) / dy : Infinity
  return Math.max(0, Math.min(tx, ty))
}
