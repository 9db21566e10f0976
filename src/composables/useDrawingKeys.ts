/** The keyboard on a section drawing: Tab goes from part to part, arrows move, plus and minus change the size. */
import type { Ref } from 'vue'
import type { Section } from '#shared/document/analysisDocument.ts'
import { moveBars, resizeRing, turnRing } from '@/drawing/edits/ringEdits.ts'
import { moveSpiral, resizeSpiral } from '@/drawing/edits/spiralEdits.ts'
import { findMirrorPartners } from '@/drawing/mirrorPartners.ts'
import { isSame, type Selection } from '@/drawing/selection.ts'

interface DrawingKeysOptions {
  section: () => Section
  selection: Ref<Selection | null>
  edit: (section: Section) => void
}

const arrows: Record<string, [x: number, y: number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
}

export function useDrawingKeys({ section, selection, edit }: DrawingKeysOptions) {
  function press(event: KeyboardEvent) {
    if (event.key === 'Tab') return cycle(event)
    if (event.key === 'Escape') {
      selection.value = null
      return
    }
    const chosen = selection.value
    if (!chosen || event.ctrlKey || event.metaKey) return
    /** mm */
    const step = event.shiftKey ? 50 : event.altKey ? 1 : 5
    const arrow = arrows[event.key]
    if (arrow) {
      event.preventDefault()
      edit(move(chosen, arrow[0] * step, arrow[1] * step))
    } else if (event.key === '+' || event.key === '-' || event.key === '=') {
      event.preventDefault()
      edit(resize(chosen, event.key === '-' ? -step : step))
    } else if (event.key === '<' || event.key === '>') {
      event.preventDefault()
      edit(turn(chosen, event.key === '<' ? 5 : -5))
    }
  }

  /** Parts in turn; past the last one, or before the first, the focus leaves the drawing. */
  function cycle(event: KeyboardEvent) {
    const { spirals, bars } = section()
    const parts: Selection[] = [
      ...spirals.map(({ id }): Selection => ({ kind: 'spiral', id })),
      ...bars.map((_, group): Selection => ({ kind: 'bars', group })),
    ]
    const at = parts.findIndex((part) => isSame(part, selection.value))
    const next = at === -1 ? (event.shiftKey ? -1 : 0) : at + (event.shiftKey ? -1 : 1)
    const part = parts[next]
    selection.value = part ?? null
    if (part) event.preventDefault()
  }

  function move(chosen: Selection, dx: number, dy: number): Section {
    const from = section()
    if (chosen.kind === 'bars') return moveBars(from, chosen.group, dx, dy)
    const spiral = from.spirals.find((one) => one.id === chosen.id)
    if (!spiral) return from
    const [x, y] = spiral.centre
    return moveSpiral(from, chosen.id, [x + dx, y + dy], findMirrorPartners(from.spirals, chosen.id))
  }

  function resize(chosen: Selection, by: number): Section {
    const from = section()
    if (chosen.kind === 'bars') {
      const layout = from.bars[chosen.group]?.layout
      return layout?.kind === 'ring' ? resizeRing(from, chosen.group, layout.diameter + by) : from
    }
    const spiral = from.spirals.find((one) => one.id === chosen.id)
    if (!spiral) return from
    return resizeSpiral(from, chosen.id, spiral.diameter + by, findMirrorPartners(from.spirals, chosen.id))
  }

  function turn(chosen: Selection, by: number): Section {
    const from = section()
    if (chosen.kind !== 'bars') return from
    const layout = from.bars[chosen.group]?.layout
    return layout?.kind === 'ring' ? turnRing(from, chosen.group, layout.startAngle + by) : from
  }

  return { press }
}
