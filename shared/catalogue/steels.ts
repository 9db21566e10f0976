/**
 * Grades of reinforcing steel to start from. Every value is a preset that the designer confirms: mill certificates and the
 * standard in force decide. Strengths in MPa, sizes in mm.
 */
import type { StrengthBasis } from '../document/analysisDocument.ts'
import { roundDerived } from '../document/fillDefaults.ts'
import type { AnalysisDocumentInput } from '../document/schema.ts'

export type SteelInput = AnalysisDocumentInput['materials']['steels'][string]

export interface SteelGrade {
  id: string
  title: string
  basis: StrengthBasis
  source: string
  /** The steel for bars of nominal diameter `barDiameter`, mm: larger bars harden sooner and stretch less. */
  create(barDiameter: number): SteelInput
}

/** Exponent of the hardening curve; Priestley, Calvi & Kowalsky 2007 (from memory). */
const hardeningExponent = 2
/** ksi to MPa, for strengths that their standard states in ksi; to 0.01 MPa. */
const gr60 = { yield: 468.84, tensile: 655, specified: { yieldStrength: 420, tensileStrength: 550 } }
const gr80 = { yield: 586.05, tensile: 772.21, specified: { yieldStrength: 550, tensileStrength: 690 } }

const guide =
  'AASHTO Guide Specifications for LRFD Seismic Bridge Design, Table 8.4.2-1, and California Seismic Design Criteria 3.2.3 (from memory)'

export const steelGrades: readonly SteelGrade[] = [
  {
    id: 'a706-60-expected',
    title: 'A706 Grade 60, expected',
    basis: 'expected',
    source: guide,
    create: (barDiameter) => createGrade60(barDiameter, { small: 0.12, large: 0.09 }, { small: 0.09, large: 0.06 }),
  },
  {
    id: 'a615-60-expected',
    title: 'A615 Grade 60, expected',
    basis: 'expected',
    source: guide,
    create: (barDiameter) => createGrade60(barDiameter, { small: 0.09, large: 0.06 }, { small: 0.06, large: 0.04 }),
  },
  {
    id: 'a706-80-expected',
    title: 'A706 Grade 80, expected',
    basis: 'expected',
    source:
      'Overby, Kowalsky & Seracino 2017, Constr. Build. Mater. 145, 292-302 (figures from memory, to be confirmed)',
    create: () => createPlateau(gr80, 0.0074, 0.0954, 0.06),
  },
  createEurocode('b500b', 'B500B', 1.08, 0.05, 'specified'),
  createEurocode('b500b', 'B500B', 1.08, 0.05, 'expected'),
  createEurocode('b500c', 'B500C', 1.15, 0.075, 'specified'),
  createEurocode('b500c', 'B500C', 1.15, 0.075, 'expected'),
]

/** Strains of Grade 60 part between #10 (32.3 mm) and #11 (35.8 mm). */
function createGrade60(
  barDiameter: number,
  atMaximum: { small: number; large: number },
  limit: { small: number; large: number },
): SteelInput {
  const size = barDiameter < 34 ? 'small' : 'large'
  return createPlateau(gr60, findHardeningStrain(barDiameter), atMaximum[size], limit[size])
}

/** Onset of strain hardening by size: to #8, #9, #10 and #11, #14, #18. */
function findHardeningStrain(barDiameter: number): number {
  if (barDiameter < 27) return 0.015
  if (barDiameter < 30) return 0.0125
  if (barDiameter < 39) return 0.0115
  return barDiameter < 50 ? 0.0075 : 0.005
}

function createPlateau(
  strength: typeof gr60,
  hardeningStrain: number,
  strainAtMaximumStress: number,
  limitStrain: number,
): SteelInput {
  const rise = strength.tensile - strength.yield
  return {
    law: 'plateau-hardening',
    yieldStrength: strength.yield,
    tensileStrength: strength.tensile,
    hardeningStrain,
    hardeningModulus: roundDerived((hardeningExponent * rise) / (strainAtMaximumStress - hardeningStrain)),
    strainAtMaximumStress,
    limitStrain,
    specified: { ...strength.specified },
  }
}

/** `ratio`: least tensile over yield strength of the class. Mean strengths: 1.15 fyk and 1.20 ftk. */
function createEurocode(
  id: string,
  title: string,
  ratio: number,
  strainAtMaximumStress: number,
  basis: 'specified' | 'expected',
): SteelGrade {
  const yieldStrength = 500
  const tensileStrength = roundDerived(yieldStrength * ratio)
  const isMean = basis === 'expected'
  return {
    id: `${id}-${basis}`,
    title: `${title}, ${basis}`,
    basis,
    source: isMean
      ? 'EN 1992-1-1 Annex C; mean values 1.15 fyk and 1.20 ftk, EN 1998-2 Annex E (from memory)'
      : 'EN 1992-1-1 Annex C, least values (from memory)',
    create: () => ({
      law: 'menegotto-pinto',
      yieldStrength: isMean ? roundDerived(1.15 * yieldStrength) : yieldStrength,
      tensileStrength: isMean ? roundDerived(1.2 * tensileStrength) : tensileStrength,
      strainAtMaximumStress,
      specified: { yieldStrength, tensileStrength },
    }),
  }
}
