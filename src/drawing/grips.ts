/** Where the handles of a selected part stand, and how thick wires and bars are drawn. Pixels of the drawing. */
import type { Section, Spiral } from '#shared/document/analysisDocument.ts'
import { computeBarCentres } from '#shared/geometry/bars.ts'
import type { Grip, Selection } from './selection.ts'
import type { ViewTransform } from './viewTransform.ts'

export interface Handle {
  grip: Grip
  x: number
  y: number
  cursor: 'move' | 'ew-resize' | 'ns-resize' | 'pointer'
}

/** Side of a handle as drawn, px. */
export const handleSize = 9
/** Width within which a handle is taken, px: by a mouse or pen, by a finger. */
export const fineReach = 24
export const coarseReach = 44

/** Wires are never drawn thinner than can be seen. */
export function computeWireWidth(barDiameter: number, view: ViewTransform): number {
  return Math.max(2.6, barDiameter * view.scale)
}

export function computeBarRadius(diameter: number, view: ViewTransform): number {
  return Math.max(2.4, (diameter / 2) * view.scale)
}

/** Handles of what is selected: the centre and four edges of a spiral, the first bar of a group. */
export function listHandles(section: Section, view: ViewTransform, selection: Selection | null): Handle[] {
  if (!selection) return []
  if (selection.kind === 'spiral') {
    const spiral = section.spirals.find((one) => one.id === selection.id)
    return spiral ? listSpiralHandles(spiral, view) : []
  }
  const group = section.bars[selection.group]
  if (!group) return []
  const [first] = computeBarCentres(group.layout)
  if (!first) return []
  const grip: Grip = { kind: group.layout.kind === 'ring' ? 'ring' : 'bars', group: selection.group }
  return [{ grip, x: view.x(first[0]), y: view.y(first[1]), cursor: 'move' }]
}

/** The edge handles stand against the outside of the wire, so that they do not cover the bars within. */
function listSpiralHandles(spiral: Spiral, view: ViewTransform): Handle[] {
  const x = view.x(spiral.centre[0])
  const y = view.y(spiral.centre[1])
  const off =
    (spiral.diameter / 2) * view.scale + computeWireWidth(spiral.barDiameter, view) / 2 + handleSize / 2 + 0.5
  const grip: Grip = { kind: 'resize-spiral', id: spiral.id }
  return [
    { grip: { kind: 'move-spiral', id: spiral.id }, x, y, cursor: 'move' },
    { grip, x: x + off, y, cursor: 'ew-resize' },
    { grip, x, y: y - off, cursor: 'ns-resize' },
    { grip, x: x - off, y, cursor: 'ew-resize' },
    { grip, x, y: y + off, cursor: 'ns-resize' },
  ]
}
