/** What a key does to the selected part: arrows move it, + and - change its diameter, < and > turn a ring of bars. mm. */
import type { Point, Section } from '#shared/document/analysisDocument.ts'
import { moveBars } from './edits/moveBars.ts'
import { moveSpiral } from './edits/moveSpiral.ts'
import { resizeRing } from './edits/resizeRing.ts'
import { resizeSpiral } from './edits/resizeSpiral.ts'
import { findRingPartners } from './edits/ringPartners.ts'
import { turnRing } from './edits/turnRing.ts'
import { findMirrorPartners } from './mirrorPartners.ts'
import type { Selection } from './selection.ts'

export interface KeyPress {
  key: string
  /** Tells the number pad from the row of figures: there Shift only makes the plus. */
  code: string
  shiftKey: boolean
  altKey: boolean
}

/** mm */
const usual = 5
const large = 50
const fine = 1
/** degrees */
const turnStep = 1

const arrows: Record<string, Point> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
}
const sizes: Record<string, 1 | -1> = { '+': 1, '=': 1, '-': -1, '\u2212': -1, _: -1 }
const turns: Record<string, 1 | -1> = { '<': 1, '>': -1 }

/** The section after a key, or null for a key that means nothing here. */
export function findKeyEdit(
  section: Section,
  selection: Selection,
  press: KeyPress,
  alone: boolean,
): Section | null {
  const arrow = arrows[press.key]
  if (arrow) {
    const by = press.altKey ? fine : press.shiftKey ? large : usual
    return move(section, selection, arrow[0] * by, arrow[1] * by, alone)
  }
  const size = sizes[press.key]
  if (size !== undefined) {
    const wide = press.shiftKey && press.code.startsWith('Numpad')
    return resize(section, selection, size * (press.altKey ? fine : wide ? large : usual), alone)
  }
  const turn = turns[press.key]
  if (turn === undefined || selection.kind !== 'bars') return null
  const partners = alone ? [] : findRingPartners(section, selection.group)
  return turnRing(section, selection.group, turn * turnStep, partners)
}

function move(
  section: Section,
  selection: Selection,
  dx: number,
  dy: number,
  alone: boolean,
): Section | null {
  if (selection.kind === 'bars') return moveBars(section, selection.group, dx, dy)
  const spiral = section.spirals.find((one) => one.id === selection.id)
  if (!spiral) return null
  const centre: Point = [spiral.centre[0] + dx, spiral.centre[1] + dy]
  return moveSpiral(section, spiral.id, centre, alone ? [] : findMirrorPartners(section.spirals, spiral.id))
}

function resize(section: Section, selection: Selection, by: number, alone: boolean): Section | null {
  if (selection.kind === 'bars') {
    const { group } = selection
    const layout = section.bars[group]?.layout
    if (layout?.kind !== 'ring') return null
    return resizeRing(section, group, layout.diameter + by, alone ? [] : findRingPartners(section, group))
  }
  const spiral = section.spirals.find((one) => one.id === selection.id)
  if (!spiral) return null
  const partners = alone ? [] : findMirrorPartners(section.spirals, spiral.id)
  return resizeSpiral(section, spiral.id, spiral.diameter + by, partners)
}
