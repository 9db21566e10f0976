import { describe, expect, it } from 'vitest'
import { findRoot } from '#workers/solver/numeric/roots.ts'

/** Calls that a search takes. */
function count(f: (x: number) => number) {
  const counted = (x: number) => {
    counted.calls += 1
    return f(x)
  }
  counted.calls = 0
  return counted
}

describe('findRoot', () => {
  it('finds the root of functions with known roots', () => {
    expect(findRoot((x) => x * x - 2, 0, 2, 0)).toBeCloseTo(Math.SQRT2, 14)
    expect(findRoot((x) => Math.cos(x) - x, 0, 1, 0)).toBeCloseTo(0.7390851332151607, 14)
    expect(findRoot((x) => Math.exp(x) - 1e6, 20, -20, 0)).toBeCloseTo(Math.log(1e6), 12)
  })

  it('takes far fewer calls than bisection, and never many more', () => {
    const smooth = count((x) => x ** 3 - x - 2)
    findRoot(smooth, 1, 2, 1e-12)
    expect(smooth.calls).toBeLessThan(14)
    // A root of the ninth order and a step are the worst cases for interpolation.
    const flat = count((x) => (x - 0.3) ** 9)
    expect(Math.abs(findRoot(flat, -1, 4, 1e-12) - 0.3)).toBeLessThan(1e-3)
    expect(flat.calls).toBeLessThan(100)
    const step = count((x) => (x < 0.7 ? -1 : 1))
    expect(findRoot(step, 0, 1, 1e-10)).toBeCloseTo(0.7, 9)
    expect(step.calls).toBeLessThan(100)
  })

  it('returns an end that is a root without any search', () => {
    expect(findRoot((x) => x, 0, 5, 0)).toBe(0)
    expect(findRoot((x) => x - 5, 0, 5, 0)).toBe(5)
  })

  it('throws without a change of sign, and names the bracket', () => {
    expect(() => findRoot((x) => x * x + 1, -1, 2, 0)).toThrow('No sign change between -1 (2) and 2 (5)')
  })
})
