import { describe, expect, it } from 'vitest'
import type { BranchState } from '#workers/solver/analyses/branch.ts'
import { interpolateStrain } from '#workers/solver/analyses/branch.ts'
import { findRow, insertRows } from '#workers/solver/analyses/rows.ts'
import { createCircleDocument } from '../../../../helpers/sampleSections.ts'
import { solve } from '../../../../helpers/solve.ts'

function stateAt(kappa: number, eps0 = 0, strainSlope = 0): BranchState {
  return { kappa, eps0, strainSlope, moment: 0, momentSlope: 0, residual: 0, iterations: 1 }
}

describe('rows', () => {
  it('take further states in their places', () => {
    const rows = insertRows(
      [0, 2, 4].map((kappa) => stateAt(kappa)),
      [stateAt(3), stateAt(1)],
    )
    expect(rows.map((row) => row.kappa)).toEqual([0, 1, 2, 3, 4])
  })

  it('take no state twice, and keep the row that stands there', () => {
    const first = [0, 2, 4].map((kappa) => stateAt(kappa))
    const rows = insertRows(first, [stateAt(2 + 1e-10), stateAt(4), stateAt(2)])
    expect(rows).toEqual(first)
    expect(findRow(rows, stateAt(2 + 1e-10))).toBe(first[1])
  })

  it.each([100, 200, 731])('are as many as asked for, and one for each limit state: %d', (points) => {
    const { points: columns, limitStates } = solve(createCircleDocument({ analysis: { points } }))
    const at = new Set(limitStates.map((state) => state.curvature))
    expect(columns.curvature.length).toBeGreaterThanOrEqual(points)
    expect(columns.curvature.length).toBeLessThanOrEqual(points + at.size)
    for (const curvature of at) expect(columns.curvature).toContain(curvature)
    for (const column of Object.values(columns)) {
      if (Array.isArray(column)) expect(column).toHaveLength(columns.curvature.length)
    }
  })

  it('start at zero curvature and end exactly on the stop', () => {
    const { points, limitStates, stop } = solve(createCircleDocument())
    expect(points.curvature[0]).toBe(0)
    expect(points.neutralAxisDepth[0]).toBeNull()
    const last = limitStates.find((state) => state.kind === stop.reason)!
    expect(points.curvature.at(-1)).toBe(last.curvature)
    expect(points.moment.at(-1)).toBe(last.moment)
  })

  it('tell the neutral axis by strains: zero strain lies at its depth', () => {
    const { points } = solve(createCircleDocument())
    points.curvature.forEach((kappa, i) => {
      if (kappa === 0) return
      const strain = points.concreteStrain[i] - kappa * points.neutralAxisDepth[i]!
      expect(Math.abs(strain)).toBeLessThan(1e-15)
    })
  })
})

describe('strain between two states', () => {
  it('is the cubic through values and slopes', () => {
    const f = (x: number) => 1 + 2 * x - x * x + 0.5 * x ** 3
    const slope = (x: number) => 2 - 2 * x + 1.5 * x * x
    const [from, to] = [1, 4].map((x) => stateAt(x, f(x), slope(x)))
    for (const x of [1, 1.7, 3, 4]) expect(interpolateStrain(from, to, x)).toBeCloseTo(f(x), 12)
  })
})
