import { describe, expect, it } from 'vitest'
import type { Steel } from '#shared/document/analysisDocument.ts'
import { createSteelLaw, type SteelLaw } from '#workers/solver/section/steelLaw.ts'
import { expectDerivative, readTable } from '../../../../helpers/derivatives.ts'
import {
  createCircleDocument,
  longitudinal,
  plateau,
  transverse,
} from '../../../../helpers/sampleSections.ts'
import { readSound } from '../../../../helpers/solve.ts'

/** The steel with every default filled in. */
function fill(steel: unknown): Steel {
  return readSound(createCircleDocument({ steels: { L: steel } })).materials.steels.L
}

const steels: Record<string, Steel> = {
  'menegotto-pinto': fill(longitudinal),
  'menegotto-pinto, R0 5': fill({ ...longitudinal, r0: 5, a1: 4 }),
  'menegotto-pinto, no hardening': fill({ ...longitudinal, hardeningRatio: 0 }),
  'plateau-hardening': fill(plateau),
  'elastic-plastic': fill(transverse),
}

/** As the resultants read it. */
function computeStress(law: SteelLaw, eps: number): number {
  const size = Math.abs(eps)
  if (law.table !== null && size <= law.table.top) return Math.sign(eps) * readTable(law.table, size).value
  return law.computeStress(eps)
}

function computeTangent(law: SteelLaw, eps: number): number {
  const size = Math.abs(eps)
  if (law.table !== null && size <= law.table.top) return readTable(law.table, size).slope
  return law.computeTangent(eps)
}

describe.each(Object.entries(steels))('%s', (_, steel) => {
  const law = createSteelLaw(steel)

  it('starts with its modulus and is odd in the strain', () => {
    expect(computeTangent(law, 1e-9)).toBeCloseTo(steel.modulus, 2)
    for (const eps of [0.0005, 0.003, 0.02, 0.07]) {
      expect(computeStress(law, -eps)).toBe(-computeStress(law, eps))
      expect(computeTangent(law, -eps)).toBe(computeTangent(law, eps))
    }
  })

  it('has the numerical derivative of its stress as tangent, also across the end of the table', () => {
    const bends = [law.yieldStrain, 'hardeningStrain' in steel ? steel.hardeningStrain : 0]
    for (let eps = -0.09; eps < 0.09; eps += 0.00041) {
      if (bends.some((bend) => Math.abs(Math.abs(eps) - bend) < 1e-6)) continue
      expectDerivative(
        (at) => computeStress(law, at),
        (at) => computeTangent(law, at),
        eps,
        steel.modulus,
      )
    }
  })

  it('does not jump where its table ends', () => {
    const top = law.table?.top ?? law.yieldStrain
    const jump = Math.abs(computeStress(law, top * (1 + 1e-12)) - computeStress(law, top * (1 - 1e-12)))
    expect(jump / steel.yieldStrength).toBeLessThan(1e-6)
  })
})

describe('plateau-hardening', () => {
  it('is gone past the strain at maximum stress', () => {
    const law = createSteelLaw(steels['plateau-hardening'])
    expect(law.computeStress(0.1)).toBeCloseTo(620, 9)
    expect(law.computeStress(0.1001)).toBe(0)
    expect(law.computeStress(-0.1001)).toBe(-0)
  })
})

describe('the limit strain', () => {
  it('is three quarters of the strain at maximum stress, or none', () => {
    expect(createSteelLaw(fill(longitudinal)).limitStrain).toBeCloseTo(0.0675, 12)
    expect(createSteelLaw(fill({ law: 'elastic-plastic', yieldStrength: 400 })).limitStrain).toBeNull()
  })
})
