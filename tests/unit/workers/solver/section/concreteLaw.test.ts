import { describe, expect, it } from 'vitest'
import { createConcreteLaw } from '#workers/solver/section/concreteLaw.ts'
import { readSound } from '../../../../helpers/solve.ts'
import { createCircleDocument } from '../../../../helpers/sampleSections.ts'
import { expectDerivative, readTable } from '../../../../helpers/derivatives.ts'

const { concrete } = readSound(createCircleDocument()).materials

describe('a concrete law', () => {
  it('has the numerical derivative of its stress as tangent, confined or not', () => {
    for (const confiningStress of [0, 0.3, 2, 8]) {
      const law = createConcreteLaw(concrete, confiningStress, 0.05)
      for (let eps = 0.0001; eps < 0.06; eps += 0.00037) {
        if (law.kinks.some((kink) => Math.abs(kink - eps) < 1e-6)) continue
        expectDerivative(law.computeStress, law.computeTangent, eps, concrete.modulus)
      }
    }
  })

  it('has a table that misses stress by less than 1e-6 and slope by less than 1e-4 of the law', () => {
    for (const confiningStress of [0, 0.05, 2, 8]) {
      const law = createConcreteLaw(concrete, confiningStress, 0.05)
      for (let eps = 0; eps <= law.table.top; eps += law.table.top / 1777) {
        const { value, slope } = readTable(law.table, eps)
        expect(Math.abs(value - law.computeStress(eps)) / law.strength).toBeLessThan(1e-6)
        expect(Math.abs(slope - law.computeTangent(eps)) / concrete.modulus).toBeLessThan(1e-4)
      }
    }
  })

  it('rises to its strength at its peak strain and softens beyond', () => {
    const law = createConcreteLaw(concrete, 2, 0.05)
    expect(law.computeStress(law.peakStrain)).toBeCloseTo(law.strength, 10)
    expect(law.computeTangent(law.peakStrain)).toBeCloseTo(0, 8)
    expect(law.computeTangent(0.9 * law.peakStrain)).toBeGreaterThan(0)
    expect(law.computeTangent(1.1 * law.peakStrain)).toBeLessThan(0)
    expect(law.computeStress(-0.001)).toBe(0)
  })

  it('without confinement falls straight to zero at the spalling strain, with one bend each', () => {
    const law = createConcreteLaw(concrete, 0, 0.05)
    expect(law.kinks).toEqual([0, 2 * concrete.peakStrain, concrete.spallingStrain])
    const [, line, end] = law.kinks
    const atLine = law.computeStress(line)
    expect(law.computeStress((line + end) / 2)).toBeCloseTo(atLine / 2, 10)
    expect(law.computeStress(end)).toBe(0)
    expect(law.computeStress(0.1)).toBe(0)
    // What the resultants take beyond the table is the same line.
    expect(law.lineSlope * (line - end)).toBeCloseTo(atLine, 10)
  })

  it('stays finite at strains beyond all reason', () => {
    for (const eps of [1, 1e3, 1e30, 1e300]) {
      const law = createConcreteLaw(concrete, 2, 0.05)
      expect(law.computeStress(eps)).toBeGreaterThanOrEqual(0)
      expect(Number.isFinite(law.computeTangent(eps))).toBe(true)
    }
  })
})
