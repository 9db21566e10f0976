import { describe, expect, it } from 'vitest'
import {
  computeConfiningStress,
  computeEffectiveness,
  computeMassPerLength,
  computeUltimateStrain,
  computeVolumetricRatio,
} from '#workers/solver/materials/confinement.ts'
import {
  computeConfinedPeakStrain,
  computeConfinedStrength,
} from '#workers/solver/materials/manderConfined.ts'

describe('confinement by one spiral', () => {
  it('presses as the hoop force does: 2 Asp fyh / (ds s) at full effectiveness', () => {
    const rhoS = computeVolumetricRatio(113, 900, 75)
    expect(computeConfiningStress(1, rhoS, 420)).toBeCloseTo((2 * 113 * 420) / (900 * 75), 12)
  })

  it('is less effective for hoops, by the square', () => {
    const spiral = computeEffectiveness('spiral', 90, 900, 0)
    expect(spiral).toBeCloseTo(0.95, 14)
    expect(computeEffectiveness('hoop', 90, 900, 0)).toBeCloseTo(0.95 * 0.95, 14)
  })

  it('is never more effective than 1, nor less than 0', () => {
    expect(computeEffectiveness('spiral', 20, 900, 0.05)).toBe(1)
    expect(computeEffectiveness('spiral', 5000, 900, 0.02)).toBe(0)
    // As hoops the square must not turn a negative arch into a positive one.
    expect(computeEffectiveness('hoop', 5000, 900, 0.02)).toBe(0)
    expect(computeEffectiveness('spiral', 60, 900, 1.2)).toBe(1)
  })

  it('adds nothing to the strength without pressure', () => {
    expect(computeConfinedStrength(37, 0)).toBe(37)
    expect(computeConfinedPeakStrain(0.002, 37, 37)).toBe(0.002)
  })

  it('grows with the pressure, by less and less', () => {
    const strengths = [0, 1, 2, 3, 4].map((fl) => computeConfinedStrength(35, fl))
    const gains = strengths.slice(1).map((strength, i) => strength - strengths[i])
    expect(Math.min(...gains)).toBeGreaterThan(0)
    expect(gains).toEqual([...gains].sort((a, b) => b - a))
  })

  it('leaves 0.004 where there is no spiral steel to strain', () => {
    expect(computeUltimateStrain(0, 420, 0.12, 40)).toBe(0.004)
    expect(computeUltimateStrain(0.01, 420, 0, 40)).toBe(0.004)
  })

  it('weighs more as a helix than as hoops', () => {
    const ratio = computeMassPerLength('spiral', 100, 500, 300) / computeMassPerLength('hoop', 100, 500, 300)
    expect(ratio).toBeCloseTo(Math.hypot(1, 300 / (Math.PI * 500)), 12)
  })
})
