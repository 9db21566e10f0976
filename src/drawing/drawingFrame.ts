/** How a drawing is divided: the section, the room for dimensions round it, the strain diagram and the key beside it. px. */
import type { Bounds } from '#shared/geometry/outline.ts'
import { createViewTransform, type ViewTransform } from './viewTransform.ts'

export interface DrawingFrame {
  width: number
  height: number
  view: ViewTransform
  /** Section as the outline bounds it. */
  left: number
  right: number
  top: number
  bottom: number
  /** Only the outer dimension and leaders. */
  compact: boolean
  /** Free room for the compressed-side arrow between the section and its dimensions. */
  bands: Bands
  /** Left edge of the strain diagram; null: there is no room for it. */
  diagramLeft: number | null
  /** Left edge of the key; null: there is no room for it. */
  keyLeft: number | null
}

export interface Bands {
  left: number
  right: number
  bottom: number
}

export const diagramWidth = 150
export const keyWidth = 98
/** Between the section and what stands to its right: leaders and an upright dimension. */
const gapWidth = 66
const band = 38
const tallest = 404
/** Narrower than this a drawing is compact, and wider than these it has a key and a strain diagram beside it. */
const compactBelow = 520
const diagramFrom = 640

interface FrameOptions {
  angle: number
  compact: boolean
  /** Room for the strain diagram is wanted. */
  diagram: boolean
  /** Room for the tag of a selected part is wanted. */
  tag: boolean
}

export function createDrawingFrame(
  width: number,
  bounds: Bounds,
  { angle, compact, diagram, tag }: FrameOptions,
): DrawingFrame {
  const small = compact || width < compactBelow
  const hasDiagram = !small && diagram && width >= diagramFrom
  const bands = small ? { left: 0, right: 0, bottom: 0 } : computeBands(angle)
  const margins = small
    ? { left: 18, right: Math.min(150, Math.max(128, 0.36 * width)), top: tag ? 76 : 20, bottom: 44 }
    : {
        left: 76 + bands.left,
        right: gapWidth + bands.right + keyWidth + (hasDiagram ? diagramWidth : 0),
        top: 78,
        bottom: 90 + bands.bottom,
      }
  const sizeX = bounds.maxX - bounds.minX
  const sizeY = bounds.maxY - bounds.minY
  const roomX = Math.max(60, width - margins.left - margins.right)
  const roomY = Math.min((roomX / sizeX) * sizeY, small ? 1.3 * roomX : tallest)
  const height = Math.round(margins.top + margins.bottom + Math.max(roomY, small ? 60 : 240))
  const view = createViewTransform(bounds, width, height, margins)
  return {
    width,
    height,
    view,
    left: view.x(bounds.minX),
    right: view.x(bounds.maxX),
    top: view.y(bounds.maxY),
    bottom: view.y(bounds.minY),
    compact: small,
    bands,
    diagramLeft: hasDiagram ? width - keyWidth - diagramWidth : null,
    keyLeft: small ? null : width - keyWidth,
  }
}

/** The arrow stands above the section without being in the way; elsewhere the dimensions make room for it. */
function computeBands(angle: number): Bands {
  const radians = (angle * Math.PI) / 180
  const [vx, vy] = [-Math.sin(radians), Math.cos(radians)]
  const level = Math.abs(vy) <= 0.5
  return {
    left: level && vx < 0 ? band : 0,
    right: level && vx > 0 ? band : 0,
    bottom: !level && vy < 0 ? band : 0,
  }
}
