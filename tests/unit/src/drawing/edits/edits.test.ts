import { describe, expect, it } from 'vitest'
import type { BarGroup, Point, Section } from '#shared/document/analysisDocument.ts'
import { moveBars } from '@/drawing/edits/moveBars.ts'
import { moveSpiral } from '@/drawing/edits/moveSpiral.ts'
import { findOwner, findOwnRings } from '@/drawing/edits/ownRings.ts'
import { resizeRing } from '@/drawing/edits/resizeRing.ts'
import { resizeSpiral } from '@/drawing/edits/resizeSpiral.ts'
import { findRingPartners } from '@/drawing/edits/ringPartners.ts'
import { turnRing } from '@/drawing/edits/turnRing.ts'
import { findMirrorPartners } from '@/drawing/mirrorPartners.ts'
import { createLayoutSection } from '../../../../helpers/drawnSections.ts'

const section = createLayoutSection('five-spirals')
const frozen = JSON.stringify(section)
const partners = findMirrorPartners(section.spirals, 'K1')

function readRing(from: Section, group: number) {
  const { layout } = from.bars[group]
  if (layout.kind !== 'ring') throw new Error(`Bars ${group} are no ring`)
  return layout
}

describe('rings that belong to a spiral', () => {
  it('are concentric and inside it', () => {
    expect(findOwnRings(section, section.spirals[0])).toEqual([0])
    expect(findOwnRings(section, section.spirals[2])).toEqual([2])
    expect(findOwner(section, 3)?.id).toBe('K3')
  })

  it('belong to the innermost of several spirals of one centre', () => {
    const [C] = section.spirals
    const inner = { ...C, id: 'I', diameter: 900 }
    const ring = (diameter: number): BarGroup => ({
      ...section.bars[0],
      layout: { ...readRing(section, 0), diameter },
    })
    const nested = { ...section, spirals: [C, inner], bars: [ring(1328), ring(840), ring(1500)] }
    expect(findOwnRings(nested, C)).toEqual([0])
    expect(findOwnRings(nested, inner)).toEqual([1])
    expect(findOwner(nested, 2)).toBeUndefined()
  })
})

describe('moveSpiral', () => {
  it('takes partners to the mirrored places and rings along', () => {
    const moved = moveSpiral(section, 'K1', [470, 480], partners)
    expect(moved.spirals.map((spiral) => spiral.centre)).toEqual([
      [0, 0],
      [470, 480],
      [-470, 480],
      [-470, -480],
      [470, -480],
    ])
    expect(readRing(moved, 1).centre).toEqual([470, 480])
    expect(readRing(moved, 3).centre).toEqual([-470, -480])
  })

  it('moves one alone and shares what did not change', () => {
    const moved = moveSpiral(section, 'K1', [470, 480], [])
    expect(moved.spirals[2]).toBe(section.spirals[2])
    expect(moved.bars[2]).toBe(section.bars[2])
    expect(moved.bars[0]).toBe(section.bars[0])
  })

  it('rounds to 0.1 mm and writes no negative zero', () => {
    const moved = moveSpiral(section, 'K1', [470.06, -0.02], [])
    expect(moved.spirals[1].centre).toEqual([470.1, 0])
    expect(Object.is(moved.spirals[1].centre[1], -0)).toBe(false)
  })
})

describe('resizeSpiral', () => {
  it('keeps bars at their distance to the wire, for partners too', () => {
    const grown = resizeSpiral(section, 'K1', 420, partners)
    expect(grown.spirals.map((spiral) => spiral.diameter)).toEqual([1380, 420, 420, 420, 420])
    for (const group of [1, 2, 3, 4]) {
      expect(readRing(grown, group).diameter - readRing(section, group).diameter).toBeCloseTo(20, 9)
    }
    expect(grown.bars[0]).toBe(section.bars[0])
  })

  it('stops at four bars across', () => {
    expect(resizeSpiral(section, 'K1', -5, []).spirals[1].diameter).toBe(48)
  })
})

describe('ring edits', () => {
  it('finds the rings that are kept alike', () => {
    expect(findRingPartners(section, 1)).toEqual([
      { group: 2, sense: -1 },
      { group: 4, sense: -1 },
      { group: 3, sense: 1 },
    ])
    expect(findRingPartners(section, 0)).toEqual([])
    const other = resizeRing(section, 3, 300, [])
    expect(findRingPartners(other, 1).map(({ group }) => group)).toEqual([2, 4])
  })

  it('changes the diameter to 0.1 mm, at least two bars wide, and leaves the spirals alone', () => {
    const sized = resizeRing(section, 1, 340.04, findRingPartners(section, 1))
    expect([1, 2, 3, 4].map((group) => readRing(sized, group).diameter)).toEqual([340, 340, 340, 340])
    expect(sized.spirals).toBe(section.spirals)
    expect(readRing(resizeRing(section, 1, 0, []), 1).diameter).toBe(58)
  })

  it('turns mirrored partners the other way, within the circle', () => {
    const turned = turnRing(section, 1, 10, findRingPartners(section, 1))
    const before = readRing(section, 1).startAngle
    expect([1, 2, 3, 4].map((group) => readRing(turned, group).startAngle)).toEqual([
      before + 10,
      before - 10,
      before + 10,
      before - 10,
    ])
    expect(readRing(turnRing(section, 0, -97.5 - 7.5, []), 0).startAngle).toBe(352.5)
    expect(readRing(turnRing(section, 0, 262.5, []), 0).startAngle).toBe(0)
  })
})

describe('moveBars', () => {
  it('moves rings, lines and points as they are', () => {
    const line = { kind: 'line' as const, from: [0, 0] as Point, to: [9, 9] as Point, count: 2 }
    const points = {
      kind: 'points' as const,
      points: [
        [1, 2],
        [3, 4],
      ] as Point[],
    }
    const bars = [
      section.bars[0],
      { ...section.bars[0], layout: line },
      { ...section.bars[0], layout: points },
    ]
    const mixed = { ...section, bars }
    expect(moveBars(mixed, 0, 5, -5).bars[0].layout).toMatchObject({ centre: [5, -5] })
    expect(moveBars(mixed, 1, 1, -1).bars[1].layout).toMatchObject({ from: [1, -1], to: [10, 8] })
    expect(moveBars(mixed, 2, 0.04, 1).bars[2].layout).toMatchObject({
      points: [
        [1, 3],
        [3, 5],
      ],
    })
  })
})

it('leaves the section it started from as it was', () => {
  expect(JSON.stringify(section)).toBe(frozen)
})
