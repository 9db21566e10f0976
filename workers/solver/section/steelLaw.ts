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
  /** Stress over strain on [0, table.top], odd in the strain; null: the closed form is as fast. */
  table: HermiteTable | null
  computeStress(eps: number): number
  computeTangent(eps: number): number
}

/** Past so many yield strains the round of a Menegotto-Pinto branch is over (R0 >= 5: within 1e-6) and cheap to compute. */
const tableYields = 8
const tablePieces = 1600

export function createSteelLaw(steel: Steel): SteelLaw {
  const { yieldStrength: fy, modulus: Es } = steel
  const common = { yieldStrain: fy / Es, limitStrain: steel.limitStrain ?? null }
  switch (steel.law) {
    case 'menegotto-pinto': {
      const { hardeningRatio: b, r0 } = steel
      const computeStress = (eps: number) => computeMenegottoPintoStress(fy, Es, b, r0, eps)
      const computeTangent = (eps: number) => computeMenegottoPintoTangent(fy, Es, b, r0, eps)
      const table = createHermiteTable(computeStress, computeTangent, (tableYields * fy) / Es, tablePieces)
      return { ...common, table, computeStress, computeTangent }
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
