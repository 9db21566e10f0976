import type { Outline } from '#shared/document/analysisDocument.ts'
import { computeOutlineBounds } from '#shared/geometry/outline.ts'

/** An outline of another kind with the same overall size (mm); a polygon starts as the rectangle round it. */
export function convertOutline(outline: Outline, kind: Outline['kind']): Outline {
  if (outline.kind === kind) return outline
  const { minX, maxX, minY, maxY } = computeOutlineBounds(outline)
  const width = maxX - minX
  const depth = maxY - minY
  switch (kind) {
    case 'circle':
      return { kind, diameter: Math.max(width, depth) }
    case 'rectangle':
      return { kind, width, depth, chamfer: 0 }
    case 'oblong':
      return { kind, width: width === depth ? 1.5 * width : width, depth }
    case 'polygon':
      return {
        kind,
        points: [
          [minX, minY],
          [maxX, minY],
          [maxX, maxY],
          [minX, maxY],
        ],
      }
  }
}
