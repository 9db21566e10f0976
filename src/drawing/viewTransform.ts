import type { Point } from '#shared/document/analysisDocument.ts'
import type { Bounds } from '#shared/geometry/outline.ts'

/** Room round the section for what is written beside it, px. */
export interface Margins {
  left: number
  right: number
  top: number
  bottom: number
}

/** From millimetres (y up) to pixels of the drawing (y down) and back. */
export interface ViewTransform {
  /** px per mm */
  scale: number
  x(mm: number): number
  y(mm: number): number
  toMm(px: number, py: number): Point
}

/** The section as large as it fits, in the middle of what the margins leave. */
export function createViewTransform(
  bounds: Bounds,
  width: number,
  height: number,
  margins: Margins,
): ViewTransform {
  const roomX = Math.max(40, width - margins.left - margins.right)
  const roomY = Math.max(40, height - margins.top - margins.bottom)
  const sizeX = bounds.maxX - bounds.minX
  const sizeY = bounds.maxY - bounds.minY
  const scale = Math.min(roomX / sizeX, roomY / sizeY)
  const left = margins.left + (roomX - sizeX * scale) / 2 - bounds.minX * scale
  const top = margins.top + (roomY - sizeY * scale) / 2 + bounds.maxY * scale
  return {
    scale,
    x: (mm) => left + mm * scale,
    y: (mm) => top - mm * scale,
    toMm: (px, py) => [(px - left) / scale, (top - py) / scale],
  }
}
