import type { Outline } from '#shared/document/analysisDocument.ts'
import { createHead } from './dimensionLines.ts'
import type { DrawingFrame } from './drawingFrame.ts'
import { formatSize } from './size.ts'
import { createTextBox, joinBoxes, type Anchor, type Box } from './textBox.ts'

/** The size of the chamfers, with an arrow onto the lower left corner, or the right one where the left is compressed. px. */
export interface ChamferNote {
  lines: { text: string; x: number; y: number }[]
  anchor: Anchor
  leader: string
  head: string
  box: Box
}

const textSize = 11

export function createChamferNote(outline: Outline, frame: DrawingFrame, angle: number): ChamferNote | null {
  if (outline.kind !== 'rectangle' || outline.chamfer === 0) return null
  const leg = (outline.chamfer / 2) * frame.view.scale
  const side = angle > 55 && angle < 170 ? 1 : -1
  const corner = side < 0 ? frame.left : frame.right
  const anchor = side < 0 ? 'end' : 'start'
  const [x, y] = [corner - side * leg, frame.bottom - leg]
  const [startX, startY] = [corner + side * 20, frame.bottom + 18]
  const length = Math.hypot(x - startX, y - startY)
  const [ux, uy] = [(x - startX) / length, (y - startY) / length]
  const size = formatSize(outline.chamfer)
  const lines = [`${size} × ${size}`, '4 chamfers'].map((text, i) => ({
    text,
    x: corner + side * 10,
    y: frame.bottom + 29 + 14 * i,
  }))
  return {
    lines,
    anchor,
    leader: `M${startX} ${startY}L${x} ${y}`,
    head: createHead(x, y, ux, uy),
    box: joinBoxes(lines.map((line) => createTextBox(line.text, line.x, line.y, textSize, 'text', anchor))),
  }
}
