import { describe, expect, it } from 'vitest'
import { computeBarCentres, placeBars } from '#shared/geometry/bars.ts'

const round = (points: readonly (readonly number[])[]) =>
  points.map((point) => point.map((value) => Math.round(value * 1e9) / 1e9 + 0))

describe('where bars stand', () => {
  it('a ring starts at its angle and runs counter-clockwise', () => {
    const centres = computeBarCentres({
      kind: 'ring',
      centre: [10, 20],
      diameter: 200,
      count: 4,
      startAngle: 90,
    })
    expect(round(centres)).toEqual([
      [10, 120],
      [-90, 20],
      [10, -80],
      [110, 20],
    ])
  })

  it('a line has a bar at each end, and a single bar in the middle', () => {
    const line = { kind: 'line', from: [0, 0], to: [300, -90], count: 4 } as const
    expect(computeBarCentres({ ...line, from: [0, 0], to: [300, -90] })).toEqual([
      [0, 0],
      [100, -30],
      [200, -60],
      [300, -90],
    ])
    expect(computeBarCentres({ kind: 'line', from: [0, 0], to: [300, -90], count: 1 })).toEqual([[150, -45]])
  })

  it('all groups in document order, each bar with what its group says', () => {
    const placed = placeBars([
      {
        layout: {
          kind: 'points',
          points: [
            [1, 2],
            [3, 4],
          ],
        },
        barDiameter: 16,
        barArea: 201,
        steel: 'L',
      },
      { layout: { kind: 'points', points: [[5, 6]] }, barDiameter: 32, barArea: 804, steel: 'M' },
    ])
    expect(placed).toEqual([
      { group: 0, x: 1, y: 2, diameter: 16, area: 201, steel: 'L' },
      { group: 0, x: 3, y: 4, diameter: 16, area: 201, steel: 'L' },
      { group: 1, x: 5, y: 6, diameter: 32, area: 804, steel: 'M' },
    ])
  })
})
