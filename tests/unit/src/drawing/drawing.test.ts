import { describe, expect, it } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { Section } from '#shared/document/analysisDocument.ts'
import { createLevelDimension, formatSize } from '@/drawing/dimensionLines.ts'
import { moveBars, resizeRing, turnRing } from '@/drawing/edits/ringEdits.ts'
import { moveSpiral, resizeSpiral } from '@/drawing/edits/spiralEdits.ts'
import { chooseHatchConstant, computeHatchSpacing, createHatchFamilies } from '@/drawing/hatching.ts'
import { findMirrorPartners } from '@/drawing/mirrorPartners.ts'
import { toOutlinePath } from '@/drawing/outlinePath.ts'
import { snapCentre, snapLength } from '@/drawing/snapping.ts'
import { createViewTransform } from '@/drawing/viewTransform.ts'
import { readSound } from '../../../helpers/solve.ts'

const section: Section = readSound(layouts.find((layout) => layout.id === 'five-spirals')!.create()).section
const [centre, K1] = section.spirals

describe('view', () => {
  const view = createViewTransform({ minX: -750, maxX: 750, minY: -750, maxY: 750 }, 800, 600, {
    left: 60,
    right: 200,
    top: 40,
    bottom: 60,
  })

  it('fits the section into what the margins leave, with y up', () => {
    expect(view.y(750)).toBeCloseTo(40, 9)
    expect(view.y(-750)).toBeCloseTo(540, 9)
    expect(view.x(-750)).toBeGreaterThanOrEqual(60)
    expect(view.x(750)).toBeLessThanOrEqual(600)
  })

  it('goes back from pixels to millimetres', () => {
    const [x, y] = view.toMm(view.x(123), view.y(-45))
    expect(x).toBeCloseTo(123, 9)
    expect(y).toBeCloseTo(-45, 9)
  })
})

describe('mirror partners', () => {
  it('finds the other corners of a corner spiral, and none of the centre spiral', () => {
    expect(
      findMirrorPartners(section.spirals, 'K1')
        .map((one) => one.id)
        .sort(),
    ).toEqual(['K2', 'K3', 'K4'])
    expect(findMirrorPartners(section.spirals, 'C')).toEqual([])
  })

  it('leaves out what is made otherwise', () => {
    const spirals = section.spirals.map((spiral) => (spiral.id === 'K3' ? { ...spiral, pitch: 60 } : spiral))
    expect(
      findMirrorPartners(spirals, 'K1')
        .map((one) => one.id)
        .sort(),
    ).toEqual(['K2', 'K4'])
  })
})

describe('edits', () => {
  it('moves a spiral with its mirror images and their rings of bars', () => {
    const moved = moveSpiral(section, 'K1', [470, 480], findMirrorPartners(section.spirals, 'K1'))
    expect(moved.spirals.slice(1).map((spiral) => spiral.centre)).toEqual([
      [470, 480],
      [-470, 480],
      [-470, -480],
      [470, -480],
    ])
    expect(moved.bars[3].layout).toMatchObject({ centre: [-470, -480] })
    expect(moved.spirals[0]).toBe(centre)
    expect(section.spirals[1]).toBe(K1)
  })

  it('keeps bars against the wire when a spiral grows', () => {
    const grown = resizeSpiral(section, 'K1', 420, [])
    expect(grown.spirals[1].diameter).toBe(420)
    const before = section.bars[1].layout
    const after = grown.bars[1].layout
    if (before.kind !== 'ring' || after.kind !== 'ring') throw new Error('rings stay rings')
    expect(after.diameter - before.diameter).toBeCloseTo(20, 9)
    expect(grown.bars[2]).toBe(section.bars[2])
  })

  it('never shrinks a spiral or ring to nothing', () => {
    expect(resizeSpiral(section, 'K1', -5, []).spirals[1].diameter).toBe(24)
    expect(resizeRing(section, 1, 0).bars[1].layout).toMatchObject({ diameter: 58 })
  })

  it('turns a ring within a circle and moves any layout of bars', () => {
    expect(turnRing(section, 0, -7.5).bars[0].layout).toMatchObject({ startAngle: 352.5 })
    const line = {
      ...section.bars[0],
      layout: {
        kind: 'line' as const,
        from: [0, 0] as [number, number],
        to: [9, 9] as [number, number],
        count: 2,
      },
    }
    expect(moveBars({ ...section, bars: [line] }, 0, 1, -1).bars[0].layout).toMatchObject({
      from: [1, -1],
      to: [10, 8],
    })
  })
})

describe('snapping', () => {
  const snap = (x: number, y: number, free = false) => snapCentre([x, y], K1, section.outline, 8, free)

  it('rests on axes, on a diagonal and on the step, and says why', () => {
    expect(snap(3, 212)).toMatchObject({ point: [0, 210], reason: 'on the upright axis' })
    expect(snap(301, 304)).toMatchObject({ point: [305, 305], reason: 'on the 45° line' })
    expect(snap(333, 212)).toMatchObject({ point: [335, 210], reason: '' })
  })

  it('names the cover where it is the usual one', () => {
    expect(snap(494, 300).reason).toContain('cover 49')
  })

  it('does nothing when it is switched off', () => {
    expect(snap(3.14159, 2.71828, true)).toEqual({ point: [3.1, 2.7], reason: 'free' })
    expect(snapLength(402.27, true)).toBe(402.3)
    expect(snapLength(402.27, false)).toBe(400)
  })
})

describe('hatching', () => {
  it('is dense in proportion to the confining stress', () => {
    expect(computeHatchSpacing(1.81)).toBeCloseTo(10.5, 1)
    expect(computeHatchSpacing(3.44)).toBeCloseTo(5.5, 1)
    expect(computeHatchSpacing(0)).toBeNull()
  })

  it('changes the constant for the whole drawing rather than clamping one zone', () => {
    const constant = chooseHatchConstant([8, 2])
    expect(computeHatchSpacing(8, constant)! * 8).toBeCloseTo(computeHatchSpacing(2, constant)! * 2, 9)
  })

  it('gives no two overlapping spirals the same direction', () => {
    const families = createHatchFamilies(section.spirals, () => 2)
    expect(new Set(families.slice(1).map((family) => family.direction)).has(families[0].direction)).toBe(
      false,
    )
  })
})

describe('lines and paths', () => {
  it('turns the arrows of a short dimension outward and sets the number beside it', () => {
    const long = createLevelDimension('a', 0, 100, 50, 40, '100')
    const short = createLevelDimension('b', 0, 10, 50, 40, '10')
    expect(long.textX).toBe(50)
    expect(short.textX).toBeGreaterThan(10)
    expect(formatSize(1500)).toBe('1500')
    expect(formatSize(92.55)).toBe('92.6')
  })

  it('closes every outline', () => {
    for (const layout of layouts) {
      const path = toOutlinePath(readSound(layout.create()).section.outline)
      expect(path.startsWith('M')).toBe(true)
      expect(path.endsWith('Z')).toBe(true)
      expect(path).not.toContain('NaN')
    }
  })
})
