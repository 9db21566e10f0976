import { layouts } from '#shared/catalogue/layouts.ts'
import type { Outline, Point, Section } from '#shared/document/analysisDocument.ts'
import { computeOutlineBounds } from '#shared/geometry/outline.ts'
import { createDrawingFrame, type DrawingFrame } from '@/drawing/drawingFrame.ts'
import { readSound } from './solve.ts'

/** Section of a layout of the catalogue. */
export function createLayoutSection(id: string): Section {
  const layout = layouts.find((one) => one.id === id)
  if (!layout) throw new Error(`No layout ${id}`)
  return readSound(layout.create()).section
}

/** An octagon of 1386 mm across with a round void, one spiral. */
export function createHollowOctagon(): Section {
  const one = createLayoutSection('one-spiral')
  const points = Array.from({ length: 8 }, (_, i): Point => {
    const angle = ((i + 0.5) * Math.PI) / 4
    return [Math.round(750 * Math.cos(angle)), Math.round(750 * Math.sin(angle))]
  })
  return {
    ...one,
    outline: { kind: 'polygon', points },
    voids: [{ kind: 'circle', centre: [0, 0], diameter: 500, lining: false }],
  }
}

export function createFrame(outline: Outline, width = 776, angle = 0, compact = false): DrawingFrame {
  const bounds = computeOutlineBounds(outline)
  return createDrawingFrame(width, bounds, { angle, compact, diagram: true, tag: true })
}
