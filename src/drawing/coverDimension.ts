import type { Section } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { createHead, numberSize, type DimensionLine } from './dimensionLines.ts'
import type { DrawingFrame } from './drawingFrame.ts'
import { computeBarRadius } from './grips.ts'
import { findLeastCover } from './leastCover.ts'
import { formatSize } from './size.ts'
import { createTextBox, joinBoxes } from './textBox.ts'

/** px of line outside each head */
const outerRun = 34
const innerRun = 16
/** Beside the centre line (px), so that the two are told apart; nearest first, for a circle falls away. */
const asides = [14, -14, 18, -18, 10, -10, 22, -22]
const wordSize = 11

/**
 * Least cover, between wire and face with the heads outside; in red how far a wire stands out. Null where there is no
 * spiral, or where the least cover lies askew. px. `first`: see `findLeastCover`.
 */
export function createCoverDimension(
  section: Section,
  frame: DrawingFrame,
  first: 0 | 1,
): DimensionLine | null {
  // A wire that stands out is told where there is most room for the words.
  const inside = findLeastCover(section, first)
  const least = inside && inside.cover < 0 ? findLeastCover(section, 1) : inside
  if (!least?.towards) return null
  const { spiral, cover, towards } = least
  const { view } = frame
  const fault = cover < -0.05
  const outer = (spiral.diameter + spiral.barDiameter) / 2
  const [dx, dy] = [towards[0], -towards[1]]
  const edge = {
    x: view.x(spiral.centre[0] + outer * towards[0]),
    y: view.y(spiral.centre[1] + outer * towards[1]),
  }
  const face = { x: edge.x + dx * cover * view.scale, y: edge.y + dy * cover * view.scale }
  const [far, near] = fault ? [edge, face] : [face, edge]
  const aside = findAside(section, frame, near, [dx, dy])
  // Across the direction: downwards for a level dimension, to the right for an upright one.
  const [ax, ay] = dy === 0 ? [0, aside] : [aside, 0]
  const tip = { x: far.x + ax, y: far.y + ay }
  const base = { x: near.x + ax, y: near.y + ay }
  const text = formatSize(Math.abs(cover))
  const words = fault ? 'outside' : 'cover'
  const level = dy === 0
  const anchor = level && dx < 0 ? 'end' : 'start'
  const textX = level ? tip.x + dx * 10 : tip.x + 5
  const textY = level ? tip.y - 4 : tip.y + dy * (outerRun - 6) - (dy > 0 ? 2 : -4)
  const word = { text: words, x: textX, y: level ? tip.y + 13 : textY + 13 }
  return {
    key: 'cover',
    line:
      `M${tip.x + dx * outerRun} ${tip.y + dy * outerRun}L${tip.x} ${tip.y}` +
      `M${base.x} ${base.y}L${base.x - dx * innerRun} ${base.y - dy * innerRun}`,
    heads: createHead(tip.x, tip.y, -dx, -dy) + createHead(base.x, base.y, dx, dy),
    extensions: '',
    text,
    textX,
    textY,
    anchor,
    upright: false,
    word,
    box: joinBoxes([
      createTextBox(text, textX, textY, numberSize, 'number', anchor),
      createTextBox(words, word.x, word.y, wordSize, 'text', anchor),
    ]),
    span: {
      left: Math.min(tip.x, base.x) - 4,
      right: Math.max(tip.x, base.x) + 4,
      top: Math.min(tip.y, base.y) - 4,
      bottom: Math.max(tip.y, base.y) + 4,
    },
    others: [],
    tone: fault ? 'fault' : 'plain',
  }
}

/** The first place beside the centre line at which the inner head meets no bar. */
function findAside(
  section: Section,
  { view }: DrawingFrame,
  near: { x: number; y: number },
  [dx, dy]: readonly [number, number],
): number {
  const bars = placeBars(section.bars).map((bar) => {
    const [x, y] = [view.x(bar.x) - near.x, view.y(bar.y) - near.y]
    return {
      inward: -(x * dx + y * dy),
      across: dy === 0 ? y : x,
      radius: computeBarRadius(bar.diameter, view),
    }
  })
  const isClear = (aside: number) =>
    bars.every(
      ({ inward, across, radius }) =>
        inward < -radius || inward > innerRun + radius || Math.abs(across - aside) > radius + 4,
    )
  return asides.find(isClear) ?? asides[0]
}
