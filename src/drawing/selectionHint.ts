import type { Section } from '#shared/document/analysisDocument.ts'
import type { DrawingFrame } from './drawingFrame.ts'
import type { PartWords } from './partWords.ts'
import { selectionDimensionOff } from './sectionDimensions.ts'
import type { Selection } from './selection.ts'
import { createTextBox, type Anchor, type Box } from './textBox.ts'

/** Words about the selected part: what goes with it, and why it rests where it does. px. */
export interface SelectionHint {
  /** "K1–K4 kept alike", or "K1 alone"; empty where nothing is alike. */
  alike: string
  /** How to have it otherwise. */
  how: string
  alikeAt: Place
  reason: string
  reasonAt: Place
  /** What is written, and what is kept free for the reason of a drag. */
  boxes: Box[]
}

interface Place {
  x: number
  y: number
  anchor: Anchor
}

const textSize = 12
/** Room kept beside the live dimension, px. */
const reasonRoom = 150

export function createHint(
  section: Section,
  selection: Selection,
  words: PartWords,
  alone: boolean,
  reason: string,
  frame: DrawingFrame,
): SelectionHint {
  const alike = words.alike === '' ? '' : alone ? `${words.name} alone` : `${words.alike} kept alike`
  const how = alike === '' || alone || frame.compact ? '' : ', Alt: this one alone'
  // A narrow drawing has its tag in the corner, and the words under it.
  const alikeAt: Place = frame.compact
    ? { x: 10, y: 47, anchor: 'start' }
    : { x: frame.width - 12, y: 18, anchor: 'end' }
  const beside = findBesideDimension(section, selection, frame)
  const fits = beside !== null && createBox(reason, beside).left >= 4
  const reasonAt = fits ? beside : { ...alikeAt, y: alikeAt.y + 16 }
  return {
    alike,
    how,
    alikeAt,
    reason,
    reasonAt,
    boxes: [
      createBox(alike + how, alikeAt),
      createBox(reason, reasonAt),
      ...(beside ? [keepRoom(beside)] : []),
    ],
  }
}

/** Beside the outer end of the level dimension of a selected spiral. */
function findBesideDimension(section: Section, selection: Selection, frame: DrawingFrame): Place | null {
  if (selection.kind !== 'spiral' || frame.compact) return null
  const spiral = section.spirals.find((one) => one.id === selection.id)
  if (!spiral || Math.abs(spiral.centre[0]) < 0.05) return null
  const x = frame.view.x(spiral.centre[0])
  const y = frame.top - selectionDimensionOff + 4
  return spiral.centre[0] > 0 ? { x: x + 8, y, anchor: 'start' } : { x: x - 8, y, anchor: 'end' }
}

function createBox(text: string, { x, y, anchor }: Place): Box {
  return createTextBox(text, x, y, textSize, 'text', anchor)
}

function keepRoom({ x, y, anchor }: Place): Box {
  return {
    left: anchor === 'start' ? x : Math.max(0, x - reasonRoom),
    right: anchor === 'start' ? x + reasonRoom : x,
    top: y - 10,
    bottom: y + 3,
  }
}
