/** One concrete law of a section in the form the resultants read: a table, its kinks, and what holds beyond the table. */
import type { Concrete } from '#shared/document/analysisDocument.ts'
import {
  computeConfinedPeakStrain,
  computeConfinedStrength,
  computeManderStress,
  computeManderTangent,
  createManderCurve,
} from '../materials/manderConfined.ts'
import {
  computeUnconfinedStress,
  computeUnconfinedTangent,
  createUnconfinedCurve,
} from '../materials/manderUnconfined.ts'
import { createHermiteTable, type HermiteTable } from '../numeric/hermiteTable.ts'

export interface ConcreteLaw {
  confiningStress: number
  strength: number
  peakStrain: number
  /** Strains at which the slope jumps, ascending, the first is 0: no stress in tension. */
  kinks: number[]
  /** Stress on [0, table.top]. */
  table: HermiteTable
  /** Between table.top and the last kink (unconfined): stress there and slope; 0 beyond the last kink. */
  lineSlope: number
  computeStress(eps: number): number
  computeTangent(eps: number): number
}

/** Pieces per strain at peak: the table, with its head, misses the law by less than 3e-7 of the strength. */
const piecesPerPeak = 60
const mostPieces = 600

/** Concrete under a confining stress (MPa); without any it is unconfined and spalls. `tableTop`: largest strain expected. */
export function createConcreteLaw(
  concrete: Concrete,
  confiningStress: number,
  tableTop: number,
): ConcreteLaw {
  const { strength: fco, peakStrain: epsCo, modulus: Ec, spallingStrain: epsSp } = concrete
  if (confiningStress === 0) {
    const law = createUnconfinedCurve(fco, epsCo, Ec, epsSp)
    const computeStress = (eps: number) => computeUnconfinedStress(law, eps)
    const computeTangent = (eps: number) => computeUnconfinedTangent(law, eps)
    return {
      confiningStress,
      strength: fco,
      peakStrain: epsCo,
      kinks: [0, law.epsLine, epsSp],
      table: createHermiteTable(computeStress, computeTangent, law.epsLine, 2 * piecesPerPeak, true),
      lineSlope: law.slopeLine,
      computeStress,
      computeTangent,
    }
  }
  const strength = computeConfinedStrength(fco, confiningStress)
  const peakStrain = computeConfinedPeakStrain(epsCo, fco, strength)
  const curve = createManderCurve(strength, peakStrain, Ec)
  const computeStress = (eps: number) => computeManderStress(curve, eps)
  const computeTangent = (eps: number) => computeManderTangent(curve, eps)
  const pieces = Math.min(mostPieces, Math.ceil((tableTop / peakStrain) * piecesPerPeak))
  return {
    confiningStress,
    strength,
    peakStrain,
    kinks: [0],
    table: createHermiteTable(computeStress, computeTangent, tableTop, Math.max(60, pieces), true),
    lineSlope: 0,
    computeStress,
    computeTangent,
  }
}
