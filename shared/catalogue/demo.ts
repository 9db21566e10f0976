/** What a new database is filled with: an invented job, and two columns that were built and tested. */
import type { AnalysisDocumentInput } from '../document/schema.ts'
import { createFiveSpirals, createMaterials, createOneSpiral, createTwoInterlocking } from './layouts.ts'

export interface DemoJob {
  title: string
  number: string
  sections: { title: string; document: AnalysisDocumentInput }[]
}

const format = 'girdwell-analysis/1'

/** Invented bridge, invented numbers. */
const ternCreek: DemoJob = {
  title: 'Tern Creek Crossing',
  number: 'TCC-2026',
  sections: [
    {
      title: 'Pier 2 column, one spiral',
      document: {
        format,
        section: createOneSpiral(1200, 70),
        materials: createMaterials(40, 35),
        cases: [
          { name: 'permanent load', axialLoad: 5_000_000 },
          { name: 'greatest load', axialLoad: 6_500_000 },
          { name: 'least load', axialLoad: 3_700_000 },
        ],
        analysis: { kind: 'moment-curvature', case: 'permanent load' },
      },
    },
    {
      title: 'Pier 3 column, five spirals',
      document: {
        format,
        section: createFiveSpirals(80),
        materials: createMaterials(45, 38),
        cases: [
          { name: 'permanent load', axialLoad: 12_000_000 },
          { name: 'permanent load, diagonal', axialLoad: 12_000_000, angle: 45 },
          { name: 'greatest load', axialLoad: 15_000_000 },
          { name: 'greatest load, diagonal', axialLoad: 15_000_000, angle: 45 },
        ],
        analysis: { kind: 'moment-curvature', case: 'permanent load' },
      },
    },
    {
      title: 'Pier 4 column, two interlocking spirals',
      document: {
        format,
        section: createTwoInterlocking(70),
        materials: createMaterials(40, 35),
        cases: [
          { name: 'permanent load, weak axis', axialLoad: 9_000_000 },
          { name: 'permanent load, strong axis', axialLoad: 9_000_000, angle: 90 },
          { name: 'greatest load, weak axis', axialLoad: 11_400_000 },
          { name: 'greatest load, strong axis', axialLoad: 11_400_000, angle: 90 },
        ],
        analysis: { kind: 'moment-curvature', case: 'permanent load, weak axis' },
      },
    },
  ],
}

const database = 'PEER structural performance database: Berry, Parrish & Eberhard 2004'

/** Two measured columns of the open performance database, with the original report. */
const measured: DemoJob = {
  title: 'Measured columns',
  number: 'REF',
  sections: [
    {
      title: 'Potangaroa et al. 1979, No. 1, octagonal',
      document: {
        format,
        notes: {
          measuredPeakMoment: '880.4 kN·m, mean of both directions',
          reference: `Potangaroa RT; Priestley MJN; Park R 1979, Univ. of Canterbury Report 79-8. ${database}`,
          modelling:
            'Octagon of 600 mm across flats. Yield and tensile strength (303 and 409 MPa) of the bars are measured; hardening strain, hardening modulus and strain at maximum stress of both steels are not in the database and are assumed. The measured moment is that at the base, axial load times displacement included; the footing confines the critical section, which the model leaves out.',
        },
        section: {
          outline: { kind: 'polygon', points: createOctagon(600) },
          spirals: [
            {
              id: 'S1',
              centre: [0, 0],
              diameter: 550,
              barDiameter: 10,
              pitch: 75,
              form: 'spiral',
              steel: 'T',
            },
          ],
          bars: [
            {
              layout: { kind: 'ring', centre: [0, 0], diameter: 516, count: 16, startAngle: 90 },
              barDiameter: 24,
              steel: 'L',
            },
          ],
        },
        materials: {
          strengthBasis: 'measured',
          concrete: { strength: 28.4, spallingStrain: 0.006 },
          steels: {
            L: {
              law: 'plateau-hardening',
              yieldStrength: 303,
              tensileStrength: 409,
              hardeningStrain: 0.015,
              hardeningModulus: 3500,
              strainAtMaximumStress: 0.12,
            },
            T: { law: 'elastic-plastic', yieldStrength: 300, strainAtMaximumStress: 0.12 },
          },
        },
        analysis: { kind: 'moment-curvature', axialLoad: 1_920_000 },
      },
    },
    {
      title: 'Lehman et al. 1998, No. 415, circular',
      document: {
        format,
        notes: {
          measuredPeakMoment: '696.7 kN·m, mean of both directions',
          reference: `Lehman DE; Moehle JP 1998, PEER Report 1998/01. ${database}`,
          modelling:
            'Circle of 609.6 mm. Yield and tensile strength (462 and 630 MPa) of the bars are measured; hardening strain, hardening modulus and strain at maximum stress of both steels are not in the database and are assumed. The measured moment is that at the base, axial load times displacement included.',
        },
        section: {
          outline: { kind: 'circle', diameter: 609.6 },
          spirals: [
            {
              id: 'S1',
              centre: [0, 0],
              diameter: 565.2,
              barDiameter: 6.4,
              pitch: 31.8,
              form: 'spiral',
              steel: 'T',
            },
          ],
          bars: [
            {
              layout: { kind: 'ring', centre: [0, 0], diameter: 542.9, count: 22, startAngle: 90 },
              barDiameter: 15.9,
              steel: 'L',
            },
          ],
        },
        materials: {
          strengthBasis: 'measured',
          concrete: { strength: 31, spallingStrain: 0.006 },
          steels: {
            L: {
              law: 'plateau-hardening',
              yieldStrength: 462,
              tensileStrength: 630,
              hardeningStrain: 0.008,
              hardeningModulus: 3000,
              strainAtMaximumStress: 0.12,
            },
            T: { law: 'elastic-plastic', yieldStrength: 606.8, strainAtMaximumStress: 0.1 },
          },
        },
        analysis: { kind: 'moment-curvature', axialLoad: 653_860 },
      },
    },
  ],
}

export const demoJobs: DemoJob[] = [ternCreek, measured]

/** Corners of a regular octagon with level flats, `across` mm from flat to flat. */
function createOctagon(across: number): [number, number][] {
  const half = across / 2
  const reach = Number((half * Math.tan(Math.PI / 8)).toFixed(3))
  return [
    [reach, half],
    [-reach, half],
    [-half, reach],
    [-half, -reach],
    [-reach, -half],
    [reach, -half],
    [half, -reach],
    [half, reach],
  ]
}
