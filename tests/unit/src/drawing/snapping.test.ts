import { describe, expect, it } from 'vitest'
import type { Point } from '#shared/document/analysisDocument.ts'
import { computeClearance } from '#shared/geometry/outline.ts'
import {
  snapCentre,
  snapRingDiameter,
  snapSpiralDiameter,
  snapStartAngle,
  type SnapContext,
} from '@/drawing/snapping.ts'
import { createLayoutSection } from '../../../helpers/drawnSections.ts'

const section = createLayoutSection('five-spirals')
const [C, K1] = section.spirals
const corners = ['K2', 'K3', 'K4']

function context(change: Partial<SnapContext> = {}): SnapContext {
  return { section, moving: corners, reach: 8, free: false, ...change }
}
const snap = (point: Point, change?: Partial<SnapContext>) => snapCentre(point, K1, context(change))

describe('snapCentre', () => {
  it('keeps to the 5 mm step without a reason where nothing is near', () => {
    expect(snap([331, 212])).toEqual({ point: [330, 210], reason: '' })
  })

  it('rests on an axis and keeps the other coordinate to the step', () => {
    expect(snap([3, 212])).toEqual({ point: [0, 210], reason: 'on the upright axis' })
    expect(snap([-212, 6])).toEqual({ point: [-210, 0], reason: 'on the level axis' })
  })

  it('rests on the 45 degree line in every quadrant', () => {
    expect(snap([301, 306])).toEqual({ point: [305, 305], reason: 'on the 45° line' })
    expect(snap([-301, 306])).toEqual({ point: [-305, 305], reason: 'on the 45° line' })
  })

  it('stops at the cover of the spirals that stay, along the 45 degree line', () => {
    // C: 1500/2 - (1380 + 20)/2 = 50 mm. K1 (outer radius 206) has it at 750 - 50 - 206 = 494.
    expect(snap([491, 495])).toEqual({ point: [494, 494], reason: 'on the 45° line, cover 50' })
  })

  it('stops at the cover of one face and keeps the other coordinate to the step', () => {
    const { point, reason } = snap([497, 303])
    expect(point).toEqual([494, 305])
    expect(reason).toBe('cover 50')
    expect(computeClearance(section.outline, point) - 206).toBeCloseTo(50, 9)
  })

  it('holds 50 mm, common practice, where no other spiral gives a cover', () => {
    const one = createLayoutSection('one-spiral')
    const small = { ...one.spirals[0], diameter: 600 }
    // Circle of 1200 mm: the centre lies 600 - 50 - 308 = 242 mm out.
    const { point, reason } = snapCentre(
      [146, 190],
      small,
      context({ section: { ...one, spirals: [small] }, moving: [] }),
    )
    expect(Math.hypot(...point)).toBeCloseTo(242, 0)
    expect(reason).toBe('cover 50')
  })

  it('rests tangent to a neighbour, within and without', () => {
    // Within C: (1380 - 400)/2 - (20 + 12)/2 = 474 mm between the centres.
    const within = snap([280, 380])
    expect(Math.hypot(...within.point)).toBeCloseTo(474, 0)
    expect(within.reason).toBe('tangent within C')
    // Beside K4, which stays: centres 400 + 12 apart.
    const beside = snapCentre([485, -75], K1, context({ moving: [] }))
    expect(beside.point[1]).toBeCloseTo(-485 + 412, 0)
    expect(beside.reason).toContain('tangent to K4')
  })

  it('rests concentric with a spiral before all else', () => {
    expect(snap([4, -3])).toEqual({ point: [0, 0], reason: 'concentric with C' })
  })

  it('does not snap to spirals that move along', () => {
    expect(snap([487, -483]).reason).not.toContain('concentric')
    expect(snap([487, -483], { moving: [] }).reason).toBe('concentric with K4')
  })

  it('goes to 0.1 mm when it is free', () => {
    expect(snap([3.14159, 2.71828], { free: true })).toEqual({ point: [3.1, 2.7], reason: 'free of snaps' })
  })

  it('rests on the axes of an outline that is not about the origin', () => {
    const moved = {
      ...section,
      spirals: [K1],
      outline: {
        kind: 'polygon' as const,
        points: [
          [0, 0],
          [2000, 0],
          [2000, 1000],
          [0, 1000],
        ] as Point[],
      },
    }
    expect(snapCentre([1003, 740], K1, context({ section: moved })).point[0]).toBe(1000)
  })
})

describe('snapSpiralDiameter', () => {
  it('stops at the cover of the others, else on the step', () => {
    // K1 at (485, 485): 750 - 485 - 50 = 215 mm to the outside of the wire, so 2 x 215 - 12.
    expect(snapSpiralDiameter(421, K1, context())).toEqual({ length: 418, reason: 'cover 50' })
    expect(snapSpiralDiameter(362, K1, context())).toEqual({ length: 360, reason: '' })
  })

  it('stops where the wires touch', () => {
    // Within K4's reach: 970 apart, less K4's 200 and both half bars: 2 (970 - 12) - 400.
    const { length, reason } = snapSpiralDiameter(1512, K1, context({ moving: [] }))
    expect(length).toBe(1516)
    expect(reason).toMatch(/^tangent to K/)
  })

  it('goes to 0.1 mm when it is free', () => {
    expect(snapSpiralDiameter(402.27, K1, context({ free: true })).length).toBe(402.3)
  })
})

describe('snapRingDiameter', () => {
  it('rests with the bars against the inside of the wire', () => {
    // 1380 - 20 - 32
    expect(snapRingDiameter(1331, 32, C, context())).toEqual({
      length: 1328,
      reason: 'bars on the wire of C',
    })
    expect(snapRingDiameter(1291, 32, C, context())).toEqual({ length: 1290, reason: '' })
  })
})

describe('snapStartAngle', () => {
  it('brings a bar, or the middle between two, onto an axis or diagonal', () => {
    expect(snapStartAngle(90.4, 24, false)).toEqual({ angle: 90, reason: 'a bar on the upright axis' })
    expect(snapStartAngle(97.9, 24, false)).toEqual({
      angle: 97.5,
      reason: 'the upright axis between two bars',
    })
  })

  it('takes whole degrees elsewhere, and a tenth when it is free', () => {
    expect(snapStartAngle(93.6, 24, false)).toEqual({ angle: 94, reason: '' })
    expect(snapStartAngle(93.64, 24, true).angle).toBe(93.6)
  })
})
