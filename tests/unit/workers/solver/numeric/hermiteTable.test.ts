import { describe, expect, it } from 'vitest'
import { createHermiteTable, type HermiteTable } from '#workers/solver/numeric/hermiteTable.ts'

function read({ coefficients: c, inverseWidth }: HermiteTable, x: number): { value: number; slope: number } {
  const piece = Math.floor(x * inverseWidth)
  const t = x * inverseWidth - piece
  const at = 4 * piece
  return {
    value: c[at] + t * (c[at + 1] + t * (c[at + 2] + t * c[at + 3])),
    slope: (c[at + 1] + t * (2 * c[at + 2] + 3 * c[at + 3] * t)) * inverseWidth,
  }
}

describe('a Hermite table', () => {
  it('is exact for a cubic, up to and including its top', () => {
    const f = (x: number) => 2 - x + 3 * x * x - 0.5 * x ** 3
    const slope = (x: number) => -1 + 6 * x - 1.5 * x * x
    const table = createHermiteTable(f, slope, 4, 7)
    for (const x of [0, 0.3, 4 / 7, 1.9, 3.999, 4]) {
      expect(read(table, x).value).toBeCloseTo(f(x), 12)
      expect(read(table, x).slope).toBeCloseTo(slope(x), 11)
    }
  })

  it('misses a smooth function by at most h^4 max|f""| / 384', () => {
    for (const pieces of [5, 10, 20]) {
      const table = createHermiteTable(Math.sin, Math.cos, 3, pieces)
      let worst = 0
      for (let x = 0; x < 3; x += 0.001) worst = Math.max(worst, Math.abs(read(table, x).value - Math.sin(x)))
      const bound = (3 / pieces) ** 4 / 384
      expect(worst).toBeLessThanOrEqual(bound * (1 + 1e-9))
      expect(worst).toBeGreaterThan(bound / 10)
    }
  })

  it('refuses an empty range', () => {
    expect(() => createHermiteTable(Math.sin, Math.cos, 0, 5)).toThrow(/top > 0/)
    expect(() => createHermiteTable(Math.sin, Math.cos, Number.NaN, 5)).toThrow(/top > 0/)
    expect(() => createHermiteTable(Math.sin, Math.cos, 1, 0)).toThrow(/pieces >= 1/)
  })
})
