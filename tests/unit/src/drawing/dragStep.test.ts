import { describe, expect, it } from 'vitest'
import { computeDragStep, type Drag } from '@/drawing/dragStep.ts'
import { findKeyEdit } from '@/drawing/keyEdit.ts'
import type { Grip, Selection } from '@/drawing/selection.ts'
import { createLayoutSection } from '../../../helpers/drawnSections.ts'

const before = createLayoutSection('five-spirals')

function drag(grip: Grip, change: Partial<Drag>) {
  return computeDragStep({
    before,
    grip,
    from: [485, 485],
    to: [485, 485],
    reach: 8,
    alone: false,
    free: false,
    turn: false,
    ...change,
  })
}

describe('computeDragStep', () => {
  it('moves a spiral by the way of the pointer, wherever it was taken', () => {
    const { section } = drag({ kind: 'move-spiral', id: 'K1' }, { from: [600, 400], to: [447, 320] })
    expect(section.spirals[1].centre).toEqual([330, 405])
    expect(section.spirals[3].centre).toEqual([-330, -405])
  })

  it('moves it alone when told so', () => {
    const { section } = drag({ kind: 'move-spiral', id: 'K1' }, { to: [332, 405], alone: true })
    expect(section.spirals[1].centre).toEqual([330, 405])
    expect(section.spirals[2]).toBe(before.spirals[2])
  })

  it('changes the diameter by twice the way from the centre', () => {
    const { section } = drag({ kind: 'resize-spiral', id: 'K1' }, { from: [700, 485], to: [669, 485] })
    expect(section.spirals.map(({ diameter }) => diameter)).toEqual([1380, 340, 340, 340, 340])
  })

  it('gives the reason with the place', () => {
    expect(drag({ kind: 'move-spiral', id: 'K1' }, { to: [301, 306] }).reason).toBe('on the 45° line')
  })

  it('resizes a ring, and turns it instead with Shift', () => {
    const grip: Grip = { kind: 'ring', group: 0 }
    const sized = drag(grip, { from: [0, 664], to: [0, 640] }).section.bars[0].layout
    expect(sized).toMatchObject({ diameter: 1280, startAngle: 97.5 })
    const turned = drag(grip, { from: [664, 0], to: [600, 600], turn: true, free: true }).section.bars[0]
      .layout
    expect(turned).toMatchObject({ diameter: 1328, startAngle: 142.5 })
  })

  it('starts every step from the section at the beginning, so a way back is no change', () => {
    const { section } = drag({ kind: 'move-spiral', id: 'K1' }, { to: [485, 485] })
    expect(section.spirals.map(({ centre }) => centre)).toEqual(before.spirals.map(({ centre }) => centre))
  })

  it('changes nothing for a part that is gone', () => {
    expect(drag({ kind: 'move-spiral', id: 'gone' }, {}).section).toBe(before)
    expect(drag({ kind: 'ring', group: 99 }, {}).section).toBe(before)
  })
})

describe('findKeyEdit', () => {
  const K1: Selection = { kind: 'spiral', id: 'K1' }
  const press = (key: string, keys: Partial<{ code: string; shiftKey: boolean; altKey: boolean }> = {}) => ({
    key,
    code: '',
    shiftKey: false,
    altKey: false,
    ...keys,
  })

  it('moves by 5 mm, with Shift by 50, with Alt by 1', () => {
    const x = (keys = {}) => findKeyEdit(before, K1, press('ArrowLeft', keys), false)?.spirals[1].centre[0]
    expect([x(), x({ shiftKey: true }), x({ altKey: true })]).toEqual([480, 435, 484])
    expect(findKeyEdit(before, K1, press('ArrowUp'), false)?.spirals[3].centre).toEqual([-485, -490])
    expect(findKeyEdit(before, K1, press('ArrowUp'), true)?.spirals[3].centre).toEqual([-485, -485])
  })

  it('changes the diameter with plus and minus; Shift that only makes the plus does not count', () => {
    const d = (key: string, keys = {}) =>
      findKeyEdit(before, K1, press(key, keys), false)?.spirals[1].diameter
    expect([d('+'), d('+', { shiftKey: true, code: 'Equal' }), d('='), d('-')]).toEqual([405, 405, 405, 395])
    expect(d('+', { shiftKey: true, code: 'NumpadAdd' })).toBe(450)
    expect(d('-', { altKey: true })).toBe(399)
  })

  it('turns a ring of bars by a degree', () => {
    const bars: Selection = { kind: 'bars', group: 0 }
    expect(findKeyEdit(before, bars, press('<'), false)?.bars[0].layout).toMatchObject({ startAngle: 98.5 })
    expect(findKeyEdit(before, K1, press('<'), false)).toBeNull()
  })

  it('leaves other keys alone', () => {
    expect(findKeyEdit(before, K1, press('x'), false)).toBeNull()
    expect(findKeyEdit(before, { kind: 'spiral', id: 'gone' }, press('+'), false)).toBeNull()
  })
})
