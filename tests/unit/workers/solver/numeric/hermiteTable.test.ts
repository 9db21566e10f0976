import { describe, expect, it } from 'vitest'
import { createHermiteTable } from '#workers/solver/numeric/hermiteTable.ts'
import { readTable } from '../../../../helpers/derivatives.ts'

describe('a Hermite table', () => {
  it('is exact for a cubic, up to and including its top', () => {
    const f = (x: number) => 2 - x + 3 * x * x - 0.5 * x ** 3
    const slope = (x: number) => -1 + 6 * x - 1.5 * x * x
    const table = createHermiteTable(f, slope, 4, 7)
    for (const x of [0, 0.3, 4 / 7, 1.9, 3.999, 4]) {
      expect(readTable(table, x).value).toBeCloseTo(f(x), 12)
      expect(readTable(table, x).slope).toBeCloseTo(slope(x), 11)
    }
  })

  it('misses a smooth function by at most h^4 max|f""| / 384', () => {
    for (const pieces of [5, 10, 20]) {
      const table = createHermiteTable(Math.sin, Math.cos, 3, pieces)
      let worst = 0
      for (let x = 0; x < 3; x += 0.001)
        worst = Math.max(worst, Math.abs(readTable(table, x).value - Math.sin(x)))
      const bound = (3 / pieces) ** 4 / 384
      expect(worst).toBeLessThanOrEqual(bound * (1 + 1e-9))
      expect(worst).toBeGreaterThan(bound / 10)
    }
  })

  it('with a head meets a function whose second derivative has no bound at zero, and does not jump', () => {
    const f = (x: number) => x ** 1.3
    const slope = (x: number) => 1.3 * x ** 0.3
    const miss = (withHead: boolean) => {
      const table = createHermiteTable(f, slope, 2, 50, withHead)
      let worst = 0
      for (let x = 1e-5; x <= 2; x += 1e-4)
        worst = Math.max(worst, Math.abs(readTable(table, x).value - f(x)))
      return worst
    }
    // The error at zero goes with the width to the power 1.3, and the head cuts the width by 16.
    expect(miss(true)).toBeLessThan(miss(false) / 20)
    const table = createHermiteTable(f, slope, 2, 50, true)
    const end = table.headTop
    expect(readTable(table, end * (1 - 1e-13)).value).toBeCloseTo(
      readTable(table, end * (1 + 1e-11)).value,
      11,
    )
  })

  it('refuses an empty range', () => {
    expect(() => createHermiteTable(Math.sin, Math.cos, 0, 5)).toThrow(/top > 0/)
    expect(() => createHermiteTable(Math.sin, Math.cos, Number.NaN, 5)).toThrow(/top > 0/)
    expect(() => createHermiteTable(Math.sin, Math.cos, 1, 0)).toThrow(/pieces >= 2/)
  })
})
