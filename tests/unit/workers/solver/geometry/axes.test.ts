import { describe, expect, it } from 'vitest'
import type { Outline } from '#shared/document/analysisDocument.ts'
import { createBendingAxes, toU, toV } from '#workers/solver/geometry/axes.ts'

const rectangle: Outline = { kind: 'rectangle', width: 400, depth: 600, chamfer: 0 }

describe('bending axes', () => {
  it('run to +y at angle 0 and turn counter-clockwise', () => {
    const at0 = createBendingAxes(rectangle, 0)
    expect([toV(at0, 10, 20), toU(at0, 10, 20)]).toEqual([20, 10])
    expect([at0.vTop, at0.vBottom]).toEqual([300, -300])
    const at90 = createBendingAxes(rectangle, 90)
    expect([toV(at90, 10, 20), toU(at90, 10, 20)]).toEqual([-10, 20])
    expect([at90.vTop, at90.vBottom]).toEqual([200, -200])
    const at45 = createBendingAxes(rectangle, 45)
    expect(toV(at45, -1, 1)).toBeCloseTo(Math.SQRT2, 14)
    expect(at45.vTop).toBeCloseTo(500 / Math.SQRT2, 10)
  })

  it('are exact at every multiple of 90 degrees, negative and beyond a turn too', () => {
    for (const angle of [-270, 90, 450]) {
      const { vx, vy, ux, uy } = createBendingAxes(rectangle, angle)
      expect([vx + 0, vy + 0, ux + 0, uy + 0]).toEqual([-1, 0, 0, 1])
    }
  })

  it('start at the centroid of the gross outline', () => {
    // Right triangle: the centroid lies at a third of either leg.
    const axes = createBendingAxes(
      {
        kind: 'polygon',
        points: [
          [0, 0],
          [900, 0],
          [0, 600],
        ],
      },
      0,
    )
    expect(axes.origin[0]).toBeCloseTo(300, 10)
    expect(axes.origin[1]).toBeCloseTo(200, 10)
    expect(axes.vTop).toBeCloseTo(400, 10)
    expect(axes.vBottom).toBeCloseTo(-200, 10)
  })
})
