import { describe, expect, it } from 'vitest'
import {
  chooseHatchConstant,
  computeHatchSpacing,
  createCircleHatch,
  createHatchFamilies,
} from '@/drawing/hatching.ts'
import { collectStresses, listHatchKeyRows } from '@/drawing/hatchKey.ts'
import { createLayoutSection } from '../../../helpers/drawnSections.ts'
import { solve } from '../../../helpers/solve.ts'
import { layouts } from '#shared/catalogue/layouts.ts'

describe('computeHatchSpacing', () => {
  it('is 19 px over the stress in MPa, so that density goes with pressure', () => {
    expect(computeHatchSpacing(1)).toBe(19)
    expect(computeHatchSpacing(1.81)).toBeCloseTo(10.5, 1)
    expect(computeHatchSpacing(3.44)).toBeCloseTo(5.5, 1)
  })

  it('stays between 3.5 and 24 px, and draws nothing without pressure', () => {
    expect(computeHatchSpacing(40)).toBe(3.5)
    expect(computeHatchSpacing(0.1)).toBe(24)
    expect(computeHatchSpacing(0)).toBeNull()
    expect(computeHatchSpacing(Number.NaN)).toBeNull()
  })
})

describe('chooseHatchConstant', () => {
  it('keeps the usual rule while nothing is clamped by it', () => {
    expect(chooseHatchConstant([1.81, 3.44])).toBe(19)
    expect(chooseHatchConstant([])).toBe(19)
  })

  it('changes the rule for the whole drawing rather than clamping one zone', () => {
    for (const stresses of [
      [8, 2],
      [0.5, 1],
      [0.2, 0.21],
    ]) {
      const constant = chooseHatchConstant(stresses)
      for (const stress of stresses) {
        expect(computeHatchSpacing(stress, constant)! * stress).toBeCloseTo(constant, 9)
      }
    }
  })
})

describe('createHatchFamilies', () => {
  it('gives no two overlapping spirals the same direction, and starts with +45 and -45', () => {
    const { spirals } = createLayoutSection('five-spirals')
    const families = createHatchFamilies(spirals, () => 2)
    expect(families.map((family) => family.direction)).toEqual([45, -45, -45, -45, -45])
    const heap = Array.from({ length: 6 }, (_, i) => ({
      ...spirals[0],
      id: `${i}`,
      centre: [i, 0] as [number, number],
    }))
    const directions = createHatchFamilies(heap, () => 2).map((family) => family.direction)
    expect(new Set(directions).size).toBe(6)
  })

  it('hatches nothing while nothing is known', () => {
    const { spirals } = createLayoutSection('two-interlocking')
    expect(createHatchFamilies(spirals, () => undefined).every((family) => family.spacing === null)).toBe(
      true,
    )
  })
})

describe('createCircleHatch', () => {
  const read = (path: string) =>
    [...path.matchAll(/M(\S+) (\S+)L(\S+) (\S+?)(?=M|$)/g)].map((match) => match.slice(1).map(Number))

  it('draws chords of the circle in its direction', () => {
    const chords = read(createCircleHatch(100, 80, 50, 10, 45))
    expect(chords.length).toBe(10)
    for (const [x1, y1, x2, y2] of chords) {
      expect(Math.hypot(x1 - 100, y1 - 80)).toBeCloseTo(50, 1)
      expect(Math.hypot(x2 - 100, y2 - 80)).toBeCloseTo(50, 1)
      // +45 degrees rises to the right, which on the screen is y falling.
      expect(y2 - y1).toBeCloseTo(-(x2 - x1), 1)
    }
  })

  it('keeps its lines on the paper when the circle moves', () => {
    const offsets = (cx: number) =>
      read(createCircleHatch(cx, 80, 50, 10, 0)).map(([, y]) => Math.round(y * 100) / 100)
    expect(offsets(100)).toEqual(offsets(137))
    expect(read(createCircleHatch(0, 83, 50, 10, 0)).every(([, y]) => Math.abs(y % 10) < 0.01)).toBe(true)
  })
})

describe('key to the hatching', () => {
  const document = layouts.find((layout) => layout.id === 'five-spirals')!.create()
  const { spirals, zones } = solve(document)
  const section = createLayoutSection('five-spirals')

  it('shows each kind of zone once with its stress: cover, single spirals, overlaps', () => {
    const rows = listHatchKeyRows(section, zones)
    expect(rows.map((row) => row.name)).toEqual(['cover', 'C', 'K1–K4', 'overlap'])
    expect(rows[0].confiningStress).toBe(0)
    expect(rows[3].confiningStress).toBeCloseTo(rows[1].confiningStress + rows[2].confiningStress, 9)
  })

  it('leaves out spirals that the section no longer has', () => {
    const without = { ...section, spirals: section.spirals.slice(0, 1) }
    expect(listHatchKeyRows(without, zones).map((row) => row.name)).toEqual(['cover', 'C'])
  })

  it('knows no stress while there are no zones', () => {
    expect(collectStresses(spirals, null).size).toBe(0)
    expect(collectStresses(spirals, zones).get('K1')).toBe(spirals[1].confiningStress)
  })
})
