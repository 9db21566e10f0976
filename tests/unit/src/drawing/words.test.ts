import { describe, expect, it } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import { describeSection } from '@/drawing/describeSection.ts'
import { findFaultyParts } from '@/drawing/faultyParts.ts'
import { toOutlinePath } from '@/drawing/outlinePath.ts'
import { listOverlaps } from '@/drawing/overlaps.ts'
import { speakPart, writePart } from '@/drawing/partWords.ts'
import { createHint } from '@/drawing/selectionHint.ts'
import { isSame, listSelectable } from '@/drawing/selection.ts'
import { createFrame, createHollowOctagon, createLayoutSection } from '../../../helpers/drawnSections.ts'

const section = createLayoutSection('five-spirals')

describe('describeSection', () => {
  it('says shape, size, spirals of one make together, and bars', () => {
    expect(describeSection(section)).toBe(
      'Rectangular section 1500 by 1500 mm. Spirals C of diameter 1380, bar 20 at pitch 80; ' +
        'K1–K4 of diameter 400, bar 12 at pitch 80. 56 longitudinal bars.',
    )
    expect(describeSection({ ...createHollowOctagon(), spirals: [], bars: [] })).toBe(
      'Polygonal section 1386 by 1386 mm, void of diameter 500. No spiral. No longitudinal bars.',
    )
  })
})

describe('words on a part', () => {
  it('name a spiral with its size and what is kept alike with it', () => {
    expect(writePart(section, { kind: 'spiral', id: 'C' })).toEqual({
      name: 'C',
      size: 'Ø1380, 20 bar at 80',
      alike: '',
    })
    expect(writePart(section, { kind: 'spiral', id: 'K3' })?.alike).toBe('K1–K4')
    expect(writePart(section, { kind: 'spiral', id: 'gone' })).toBeNull()
  })

  it('name a group of bars', () => {
    expect(writePart(section, { kind: 'bars', group: 1 })).toEqual({
      name: '8 × 29',
      size: 'on Ø359, first at 22.5°',
      alike: 'bars of K1–K4',
    })
    expect(writePart(section, { kind: 'bars', group: 9 })).toBeNull()
  })

  it('speak the place and the reason', () => {
    expect(speakPart(section, { kind: 'spiral', id: 'K2' }, 'on the 45° line')).toBe(
      'Spiral K2, diameter 400, bar 12, pitch 80, centre −485, 485, on the 45° line, K1–K4 kept alike.',
    )
  })

  it('hint at what goes along, and put the reason beside the live dimension', () => {
    const frame = createFrame(section.outline)
    const K1 = { kind: 'spiral', id: 'K1' } as const
    const words = writePart(section, K1)!
    const hint = createHint(section, K1, words, false, 'cover 50', frame)
    expect(hint.alike + hint.how).toBe('K1–K4 kept alike, Alt: this one alone')
    expect(hint.reasonAt.x).toBeCloseTo(frame.view.x(485) + 8, 9)
    expect(hint.reasonAt.y).toBe(frame.top - 20)
    expect(createHint(section, K1, words, true, '', frame).alike).toBe('K1 alone')
  })
})

describe('listOverlaps', () => {
  it('gives the depth of crossing circles once for all pairs alike', () => {
    const [overlap, ...others] = listOverlaps(section.spirals)
    // (1380 + 400)/2 - 485 sqrt(2)
    expect(overlap.depth).toBeCloseTo(890 - 485 * Math.SQRT2, 9)
    expect(others).toEqual([])
    for (const [x, y] of overlap.places) {
      expect(Math.hypot(x, y)).toBeLessThan(690)
      expect(Math.hypot(Math.abs(x) - 485, Math.abs(y) - 485)).toBeLessThan(200)
    }
  })

  it('leaves out circles apart and circles within', () => {
    const [C, K1] = section.spirals
    expect(listOverlaps([C, { ...K1, centre: [10, 0] }])).toEqual([])
    expect(listOverlaps([K1, { ...K1, id: 'far', centre: [-485, 485] }])).toEqual([])
  })
})

describe('findFaultyParts', () => {
  it('reads parts from document paths', () => {
    const faulty = findFaultyParts(section, [
      'section.spirals[2].diameter',
      'section.bars[0].layout',
      'section.voids[1]',
      'section.outline.width',
      'section.spirals[99]',
      'materials.concrete.strength',
    ])
    expect([...faulty.spirals]).toEqual(['K2'])
    expect([...faulty.bars]).toEqual([0])
    expect([...faulty.voids]).toEqual([1])
    expect(faulty.outline).toBe(true)
  })
})

describe('selection', () => {
  it('lists spirals, then bars', () => {
    const parts = listSelectable(section)
    expect(parts).toHaveLength(10)
    expect(parts[4]).toEqual({ kind: 'spiral', id: 'K4' })
    expect(parts[5]).toEqual({ kind: 'bars', group: 0 })
  })

  it('compares by what is selected', () => {
    expect(isSame({ kind: 'spiral', id: 'C' }, { kind: 'spiral', id: 'C' })).toBe(true)
    expect(isSame({ kind: 'spiral', id: 'C' }, { kind: 'bars', group: 0 })).toBe(false)
    expect(isSame(null, null)).toBe(true)
    expect(isSame(null, { kind: 'bars', group: 0 })).toBe(false)
  })
})

describe('drawing frame and outline', () => {
  it('fits the section into what the margins leave, with y up, and goes back to millimetres', () => {
    const { view, left, right, top, bottom, width, height } = createFrame(section.outline)
    expect(right - left).toBeCloseTo(bottom - top, 9)
    expect([left > 0, right < width, top > 0, bottom < height]).toEqual([true, true, true, true])
    expect(view.y(750)).toBeCloseTo(top, 9)
    const [x, y] = view.toMm(view.x(123), view.y(-45))
    expect([x, y]).toEqual([expect.closeTo(123, 9), expect.closeTo(-45, 9)])
  })

  it('has strain diagram and key where there is room, and is compact on a phone', () => {
    const wide = createFrame(section.outline, 776)
    const middle = createFrame(section.outline, 600)
    const phone = createFrame(section.outline, 345)
    expect([wide.diagramLeft, wide.keyLeft].every((x) => x !== null)).toBe(true)
    expect([middle.diagramLeft, middle.keyLeft !== null]).toEqual([null, true])
    expect([phone.compact, phone.keyLeft]).toEqual([true, null])
  })

  it('closes every outline', () => {
    for (const layout of layouts) {
      const path = toOutlinePath(createLayoutSection(layout.id).outline)
      expect(path.startsWith('M') && path.endsWith('Z')).toBe(true)
      expect(path).not.toContain('NaN')
    }
  })
})
