import { describe, expect, it } from 'vitest'
import { computeCrossings, computeLensArea, isWithinCircle } from '#shared/geometry/circles.ts'

describe('the lens of two circles', () => {
  // Closed form of two circular segments; an independent script gave these figures for radii of 542 mm.
  it.each([
    [542, 542, 542, 360850.8],
    [542, 542, 650.4, 262798.5],
    [542, 542, 813, 133166.7],
    [500, 200, 550, 38520.88],
    [400, 150, 300 * Math.SQRT2, 25501.42],
  ])('r %s and %s, %s apart', (r1, r2, d, area) => {
    expect(computeLensArea(r1, r2, d) / area).toBeCloseTo(1, 6)
    expect(computeLensArea(r2, r1, d)).toBeCloseTo(computeLensArea(r1, r2, d), 6)
  })

  it('is what level strips of both circles share', () => {
    const strips = 20_000
    for (const [r1, r2, d] of [
      [542, 542, 650],
      [690, 200, 485 * Math.SQRT2],
      [400, 150, 300],
    ]) {
      const height = (2 * r2) / strips
      let area = 0
      for (let i = 0; i < strips; i++) {
        const y = -r2 + (i + 0.5) * height
        const half1 = Math.sqrt(Math.max(0, r1 * r1 - y * y))
        const half2 = Math.sqrt(Math.max(0, r2 * r2 - y * y))
        area += Math.max(0, Math.min(half1, d + half2) - Math.max(-half1, d - half2)) * height
      }
      // Strips of 0.06 mm or less: the rounded ends miss less than 1e-5.
      expect(Math.abs(computeLensArea(r1, r2, d) / area - 1)).toBeLessThan(1e-5)
    }
  })

  it('is nothing apart and the smaller circle within', () => {
    expect(computeLensArea(100, 50, 150)).toBe(0)
    expect(computeLensArea(100, 50, 200)).toBe(0)
    expect(computeLensArea(100, 50, 50)).toBeCloseTo(Math.PI * 2500, 9)
    expect(computeLensArea(50, 100, 0)).toBeCloseTo(Math.PI * 2500, 9)
  })

  it('joins without a step where circles begin to touch', () => {
    expect(computeLensArea(100, 50, 150 - 1e-6)).toBeLessThan(1e-6)
    expect(computeLensArea(100, 50, 50 + 1e-6)).toBeCloseTo(Math.PI * 2500, 4)
  })
})

describe('crossings of two circles', () => {
  it('lie on both, the left one first', () => {
    const first = { centre: [10, 20] as [number, number], diameter: 1000 }
    const second = { centre: [-300, 250] as [number, number], diameter: 600 }
    const crossings = computeCrossings(first, second)
    expect(crossings).toHaveLength(2)
    for (const { centre, diameter } of [first, second]) {
      for (const [x, y] of crossings) {
        expect(Math.hypot(x - centre[0], y - centre[1])).toBeCloseTo(diameter / 2, 9)
      }
    }
    const turn = (x: number, y: number) => -310 * (y - 20) - 230 * (x - 10)
    expect(turn(...crossings[0])).toBeGreaterThan(0)
    expect(turn(...crossings[1])).toBeLessThan(0)
  })

  it('half chord sqrt(R² - d² / 4) of equal circles', () => {
    const circle = (x: number) => ({ centre: [x, 0] as [number, number], diameter: 1084 })
    const [upper, lower] = computeCrossings(circle(-325.2), circle(325.2))
    expect(upper[0]).toBeCloseTo(0, 9)
    // sqrt(542² - 650.4² / 4)
    expect(upper[1]).toBeCloseTo(433.6, 9)
    expect(lower[1]).toBeCloseTo(-433.6, 9)
  })

  it('are none apart, within, touching or on one another', () => {
    const unit = { centre: [0, 0] as [number, number], diameter: 2 }
    for (const other of [
      { centre: [3, 0] as [number, number], diameter: 2 },
      { centre: [2, 0] as [number, number], diameter: 2 },
      { centre: [0.1, 0] as [number, number], diameter: 1 },
      unit,
    ]) {
      expect(computeCrossings(unit, other)).toEqual([])
    }
  })
})

it('a point on the circle is not within it', () => {
  const circle = { centre: [1, 1] as [number, number], diameter: 2 }
  expect(isWithinCircle(circle, [1, 1.999])).toBe(true)
  expect(isWithinCircle(circle, [1, 2])).toBe(false)
})
