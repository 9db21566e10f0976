import { expect } from 'vitest'
import type { HermiteTable } from '#workers/solver/numeric/hermiteTable.ts'

/** As the resultants read it. */
export function readTable(table: HermiteTable, x: number): { value: number; slope: number } {
  const near = x < table.headTop
  const inverse = near ? table.headInverseWidth : table.inverseWidth
  const piece = Math.floor(x * inverse)
  const t = x * inverse - piece
  const at = 4 * piece + (near ? table.headStart : 0)
  const [c0, c1, c2, c3] = table.coefficients.subarray(at, at + 4)
  return { value: c0 + t * (c1 + t * (c2 + t * c3)), slope: (c1 + t * (2 * c2 + 3 * c3 * t)) * inverse }
}

/** The tangent at eps is the central difference of the stress, to 1e-4 of the modulus. */
export function expectDerivative(
  computeStress: (eps: number) => number,
  computeTangent: (eps: number) => number,
  eps: number,
  modulus: number,
): void {
  const step = 1e-7
  const difference = (computeStress(eps + step) - computeStress(eps - step)) / (2 * step)
  const miss = Math.abs(difference - computeTangent(eps)) / modulus
  expect(miss, `strain ${eps}: difference ${difference}, tangent ${computeTangent(eps)}`).toBeLessThan(1e-4)
}
