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
/** Expected strengths 68 and 95 ksi, 85 and 112 ksi, to 0.01 MPa. */
const expected = {
  grade60: { yieldStrength: 468.84, tensileStrength: 655 },
  grade80: { yieldStrength: 586.05, tensileStrength: 772.21 },
}
/** Least values of the standards; A615 has had two tensile strengths for Grade 60 and is left without. */
const specified = {
  a706Grade60: { yieldStrength: 420, tensileStrength: 550 },
  a615Grade60: { yieldStrength: 420 },
  a706Grade80: { yieldStrength: 550, tensileStrength: 690 },
}

const guide =
  'AASHTO Guide Specifications for LRFD Seismic Bridge Design, Table 8.4.2-1, and California Seismic Design Criteria 3.2.3 (from memory)'

export const steelGrades: readonly SteelGrade[] = [
  {
    id: 'a706-60-expected',
    title: 'A706 Grade 60, expected',
    basis: 'expected',
    source: guide,
    create: (barDiameter) =>
      createPlateau(
        expected.grade60,
        specified.a706Grade60,
        findHardeningStrain(barDiameter),
        isLarge(barDiameter) ? { atMaximum: 0.09, limit: 0.06 } : { atMaximum: 0.12, limit: 0.09 },
      ),
  },
  {
    id: 'a615-60-expected',
    title: 'A615 Grade 60, expected',
    basis: 'expected',
    source: guide,
    create: (barDiameter) =>
      createPlateau(
        expected.grade60,
        specified.a615Grade60,
        findHardeningStrain(barDiameter),
        isLarge(barDiameter) ? { atMaximum: 0.06, limit: 0.04 } : { atMaximum: 0.09, limit: 0.06 },
      ),
  },
  {
    id: 'a706-80-expected',
    title: 'A706 Grade 80, expected',
    basis: 'expected',
    source:
      'Overby, Kowalsky & Seracino 2017, Constr. Build. Mater. 145, 292-302 (figures from memory, to be confirmed)',
    create: () =>
      createPlateau(expected.grade80, specified.a706Grade80, 0.0074, { atMaximum: 0.0954, limit: 0.06 }),
  },
  createEurocode('b500b', 'B500B', 1.08, 0.05, 'specified'),
  createEurocode('b500b', 'B500B', 1.08, 0.05, 'expected'),
  createEurocode('b500c', 'B500C', 1.15, 0.075, 'specified'),
  createEurocode('b500c', 'B500C', 1.15, 0.075, 'expected'),
]

/** Strains of Grade 60 part between #10 (32.3 mm) and #11 (35.8 mm). */
function isLarge(barDiameter: number): boolean {
  return barDiameter >= 34
}

/** Onset of strain hardening by size: to #8, #9, #10 and #11, #14, #18. */
function findHardeningStrain(barDiameter: number): number {
  if (barDiameter < 27) return 0.015
  if (barDiameter < 30) return 0.0125
  if (barDiameter < 39) return 0.0115
  return barDiameter < 50 ? 0.0075 : 0.005
}

function createPlateau(
  strength: { yieldStrength: number; tensileStrength: number },
  specified: NonNullable<SteelInput['specified']>,
  hardeningStrain: number,
  strain: { atMaximum: number; limit: number },
): SteelInput {
  const rise = strength.tensileStrength - strength.yieldStrength
  return {
    law: 'plateau-hardening',
    ...strength,
    hardeningStrain,
    hardeningModulus: roundDerived((hardeningExponent * rise) / (strain.atMaximum - hardeningStrain)),
    strainAtMaximumStress: strain.atMaximum,
    limitStrain: strain.limit,
    specified: { ...specified },
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
