/** One steel in the form the resultants read. First loading only: stress depends on the strain alone. */
import type { Steel } from '#shared/document/analysisDocument.ts'
import { computeElasticPlasticStress, computeElasticPlasticTangent } from '../materials/elasticPlastic.ts'
import { computeMenegottoPintoStress, computeMenegottoPintoTangent } from '../materials/menegottoPinto.ts'
import {
  computePlateauHardeningStress,
  computePlateauHardeningTangent,
  createPlateauHardening,
} from '../materials/plateauHardening.ts'
import { createHermiteTable, type HermiteTable } from '../numeric/hermiteTable.ts'

export interface SteelLaw {
  yieldStrain: number
  limitStrain: number | null
  /** Stress over strain on [0, table.top], odd in the strain; null: the closed form is as fast and holds everywhere. */
  table: HermiteTable | null
  /** Beyond the table. */
  computeStress(eps: number): number
  computeTangent(eps: number): number
}

/**
 * The round of a Menegotto-Pinto branch is tabulated up to e yield strains with e^R0 = 1e13 (at most 64); beyond, the branch
 * is its asymptote to better than 1e-9.
 */
const roundEnds = 1e13
const mostYields = 64
/** Per yield strain: the table then misses the law by less than 1e-7 fy for R0 = 20. */
const piecesPerYield = 100
const mostPieces = 1600

export function createSteelLaw(steel: Steel): SteelLaw {
  const { yieldStrength: fy, modulus: Es } = steel
  const common = { yieldStrain: fy / Es, limitStrain: steel.limitStrain ?? null }
  switch (steel.law) {
    case 'menegotto-pinto': {
      const { hardeningRatio: b, r0 } = steel
      const computeStress = (eps: number) => computeMenegottoPintoStress(fy, Es, b, r0, eps)
      const computeTangent = (eps: number) => computeMenegottoPintoTangent(fy, Es, b, r0, eps)
      const yields = Math.min(mostYields, Math.pow(roundEnds, 1 / r0))
      const pieces = Math.min(mostPieces, Math.ceil(yields * piecesPerYield))
      return {
        ...common,
        table: createHermiteTable(computeStress, computeTangent, (yields * fy) / Es, pieces),
        computeStress: (eps) => b * Es * eps + Math.sign(eps) * (1 - b) * fy,
        computeTangent: () => b * Es,
      }
    }
    case 'plateau-hardening': {
      const law = createPlateauHardening(
        fy,
        Es,
        steel.tensileStrength,
        steel.hardeningStrain,
        steel.hardeningModulus,
        steel.strainAtMaximumStress,
      )
      return {
        ...common,
        table: null,
        computeStress: (eps) => computePlateauHardeningStress(law, eps),
        computeTangent: (eps) => computePlateauHardeningTangent(law, eps),
      }
    }
    case 'elastic-plastic':
      return {
        ...common,
        table: null,
        computeStress: (eps) => computeElasticPlasticStress(fy, Es, eps),
        computeTangent: (eps) => computeElasticPlasticTangent(fy, Es, eps),
      }
  }
}
