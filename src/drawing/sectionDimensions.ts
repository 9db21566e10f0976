/** The dimensions that a section always carries: outer sizes, places of the spirals, least cover. */
import type { Section } from '#shared/document/analysisDocument.ts'
import { computeOutlineBounds, type Bounds } from '#shared/geometry/outline.ts'
import {
  createLevelDimension,
  createUprightDimension,
  keepNumbersClear,
  type DimensionLine,
} from './dimensionLines.ts'
import type { DrawingFrame } from './drawingFrame.ts'
import { createCoverDimension } from './coverDimension.ts'
import { formatSize } from './size.ts'

/** px from the section to the chain of places, and on to the outer size. */
const chainOff = 24
const rowOff = 24
const mostPlaces = 6
/** px from the section to the level dimension of a selected spiral. */
export const selectionDimensionOff = 24

export function createSectionDimensions(section: Section, frame: DrawingFrame): DimensionLine[] {
  const { view, compact, bands } = frame
  const bounds = computeOutlineBounds(section.outline)
  const level = compact ? [] : listPlaces(section, bounds, 0)
  const upright = compact ? [] : listUprightPlaces(section, bounds, level)
  const chainY = frame.bottom + bands.bottom + chainOff
  const chainX = frame.left - bands.left - chainOff
  const lines = [
    ...level.slice(1).map((place, i) =>
      createLevelDimension(
        `x${i}`,
        view.x(level[i]),
        view.x(place),
        chainY,
        formatSize(place - level[i]),
        // The sides carry the extension lines of the outer size below.
        { from: frame.bottom },
      ),
    ),
    ...upright
      .slice(1)
      .map((place, i) =>
        createUprightDimension(
          `y${i}`,
          view.y(place),
          view.y(upright[i]),
          chainX,
          formatSize(place - upright[i]),
          { from: frame.left },
        ),
      ),
    createLevelDimension(
      'width',
      frame.left,
      frame.right,
      chainY + (level.length > 0 ? rowOff : 0),
      `${section.outline.kind === 'circle' ? 'Ø' : ''}${formatSize(bounds.maxX - bounds.minX)}`,
      { from: frame.bottom },
    ),
  ]
  if (section.outline.kind !== 'circle' && !compact) {
    lines.push(
      createUprightDimension(
        'depth',
        frame.top,
        frame.bottom,
        chainX - (upright.length > 0 ? rowOff : 16),
        formatSize(bounds.maxY - bounds.minY),
        { from: frame.left },
      ),
    )
  }
  // A chain of places takes the room at the left.
  const cover = compact ? null : createCoverDimension(section, frame, upright.length > 0 ? 1 : 0)
  if (cover) lines.push(cover)
  return keepNumbersClear(lines)
}

/** Sides and distinct centres between them, ascending; empty when every spiral stands in the middle. */
function listPlaces(section: Section, bounds: Bounds, axis: 0 | 1): number[] {
  const [least, greatest] = axis === 0 ? [bounds.minX, bounds.maxX] : [bounds.minY, bounds.maxY]
  const middle = (least + greatest) / 2
  const places = [...new Set(section.spirals.map(({ centre }) => Math.round(centre[axis] * 10) / 10))]
    .filter((place) => place > least && place < greatest)
    .sort((a, b) => a - b)
  // The middle is told by symmetry unless it breaks it.
  const symmetric = places.every((place) =>
    places.some((other) => Math.abs(other + place - 2 * middle) < 0.2),
  )
  const shown = symmetric ? places.filter((place) => Math.abs(place - middle) > 0.05) : places
  return shown.length === 0 || shown.length > mostPlaces ? [] : [least, ...shown, greatest]
}

/** None where the level places tell the same. */
function listUprightPlaces(section: Section, bounds: Bounds, level: readonly number[]): number[] {
  const places = listPlaces(section, bounds, 1)
  const same = places.length === level.length && places.every((place, i) => Math.abs(place - level[i]) < 0.05)
  return same ? [] : places
}

/** Distances of a selected spiral from the axes: level above the section, upright to its right. */
export function createSelectionDimensions(
  section: Section,
  id: string,
  frame: DrawingFrame,
  coverAtRight: boolean,
): DimensionLine[] {
  const spiral = section.spirals.find((one) => one.id === id)
  if (!spiral || frame.compact) return []
  const { view, bands } = frame
  const [x, y] = spiral.centre
  const lines: DimensionLine[] = []
  if (Math.abs(x) >= 0.05) {
    lines.push(
      createLevelDimension(
        'selected-x',
        view.x(Math.min(0, x)),
        view.x(Math.max(0, x)),
        frame.top - selectionDimensionOff,
        formatSize(Math.abs(x)),
        { tone: 'selected', from: frame.top },
      ),
    )
  }
  if (Math.abs(y) >= 0.05) {
    lines.push(
      createUprightDimension(
        'selected-y',
        view.y(Math.max(0, y)),
        view.y(Math.min(0, y)),
        frame.right + bands.right + (coverAtRight ? 46 : 20),
        formatSize(Math.abs(y)),
        { tone: 'selected', from: frame.right },
      ),
    )
  }
  return lines
}
