import { describe, expect, it } from 'vitest'
import { coarseReach, fineReach, listHandles } from '@/drawing/grips.ts'
import { findHit } from '@/drawing/hitTest.ts'
import type { Selection } from '@/drawing/selection.ts'
import { createFrame, createLayoutSection } from '../../../helpers/drawnSections.ts'

const section = createLayoutSection('five-spirals')
const { view } = createFrame(section.outline)
const x = view.x(485)
const y = view.y(485)
const radius = 200 * view.scale
const K1: Selection = { kind: 'spiral', id: 'K1' }

function hit(px: number, py: number, selection: Selection | null = null, reach = fineReach) {
  return findHit(px, py, section, view, { selection, reach })?.grip ?? null
}

describe('findHit', () => {
  it('takes the centre of any spiral within half the reach', () => {
    expect(hit(x + 8, y - 8)).toEqual({ kind: 'move-spiral', id: 'K1' })
    // Outwards, where the wire of C is not near.
    expect(hit(x + 10, y - 10)).toBeNull()
    expect(hit(x + 10, y - 10, null, coarseReach)).toEqual({ kind: 'move-spiral', id: 'K1' })
  })

  it('takes edge handles of the selected spiral only', () => {
    const edge = x + radius + 8
    expect(hit(edge, y, K1)).toEqual({ kind: 'resize-spiral', id: 'K1' })
    expect(hit(edge, y)).toEqual({ kind: 'move-spiral', id: 'K1' })
  })

  it('gives the nearest handle where the reach of several overlaps', () => {
    const small = { ...section, spirals: [{ ...section.spirals[1], diameter: 60 }], bars: [] }
    const handles = listHandles(small, view, K1)
    const right = handles[1]
    const options = { selection: K1, reach: coarseReach }
    expect(findHit(right.x - 2, right.y, small, view, options)?.grip.kind).toBe('resize-spiral')
    expect(findHit(x + 1, y, small, view, options)?.grip.kind).toBe('move-spiral')
  })

  it('takes the wire where no bar is nearer, and the bar where it is', () => {
    // Bars of K1 stand at 22.5 + 45 k degrees: at 0 degrees there is only wire.
    expect(hit(x + radius, y)).toEqual({ kind: 'move-spiral', id: 'K1' })
    const ring = section.bars[1].layout
    if (ring.kind !== 'ring') throw new Error('K1 has a ring of bars')
    const angle = (22.5 * Math.PI) / 180
    const bar = {
      x: x + (ring.diameter / 2) * view.scale * Math.cos(angle),
      y: y - (ring.diameter / 2) * view.scale * Math.sin(angle),
    }
    expect(hit(bar.x, bar.y)).toEqual({ kind: 'ring', group: 1 })
  })

  it('takes other layouts of bars as a group to move', () => {
    const points = {
      ...section.bars[0],
      layout: { kind: 'points' as const, points: [[0, 300]] as [number, number][] },
    }
    const found = findHit(view.x(0), view.y(300), { ...section, bars: [points] }, view, {
      selection: null,
      reach: fineReach,
    })
    expect(found?.grip).toEqual({ kind: 'bars', group: 0 })
  })

  it('takes a spiral by its name, and nothing on empty paper', () => {
    const names = [{ id: 'K3', box: { left: 5, right: 25, top: 5, bottom: 25 } }]
    expect(findHit(10, 10, section, view, { selection: null, reach: fineReach, names })?.grip).toEqual({
      kind: 'move-spiral',
      id: 'K3',
    })
    expect(findHit(2, 2, section, view, { selection: null, reach: fineReach, names })).toBeNull()
  })
})

describe('listHandles', () => {
  it('stands the edge handles outside the wire, clear of the bars within', () => {
    const [centre, right, top] = listHandles(section, view, K1)
    expect([centre.x, centre.y]).toEqual([x, y])
    expect(right.x - x).toBeGreaterThan(radius + 4.5)
    expect(y - top.y).toBeCloseTo(right.x - x, 9)
  })

  it('has none for a part that is gone', () => {
    expect(listHandles(section, view, { kind: 'spiral', id: 'gone' })).toEqual([])
    expect(listHandles(section, view, { kind: 'bars', group: 99 })).toEqual([])
  })
})
