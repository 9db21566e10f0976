/** Single formulas against values computed from the published equations by an independent script (six to seven digits). */
import { describe, it } from 'vitest'
import { idealiseCurve } from '#workers/solver/analyses/idealise.ts'
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
  computeManderStress,
  createManderCurve,
} from '#workers/solver/materials/manderConfined.ts'
import { computeUnconfinedStress, createUnconfinedCurve } from '#workers/solver/materials/manderUnconfined.ts'
import { computeMenegottoPintoStress } from '#workers/solver/materials/menegottoPinto.ts'
import {
  computePlateauHardeningStress,
  createPlateauHardening,
} from '#workers/solver/materials/plateauHardening.ts'
import { computeLensArea } from '#shared/geometry/circles.ts'
import { expectReference } from '../helpers/referenceTable.ts'

const mander = 'Mander, Priestley & Park 1988, J. Struct. Eng. 114(8), 1804-1826; equations from memory'
const tolerance = 1e-6
const reason = 'closed form, seven digits given'

function expectAll(
  source: string,
  inputs: string,
  rows: [id: string, got: number, wanted: number][],
  near = tolerance,
) {
  for (const [id, got, wanted] of rows)
    expectReference({ id, source, inputs, got, wanted, tolerance: near, reason })
}

/** Circle of 1200 mm, 50 mm cover, 16 mm spiral at 80 mm, 24 bars of 32 mm, f'co 35, fyh 420. */
const ds = 1084
const Ec = 5000 * Math.sqrt(35)
const rhoS = computeVolumetricRatio(201.0619, ds, 80)
const rhoCc = 19301.9 / ((Math.PI * ds * ds) / 4)

describe('confined concrete', () => {
  it('has the strength of the closed form for equal pressures', () => {
    expectAll(mander, 'fl / fco 0.05, 0.1, 0.2, 0.3', [
      ['0.05', computeConfinedStrength(1, 0.05), 1.31011],
      ['0.10', computeConfinedStrength(1, 0.1), 1.565014],
      ['0.20', computeConfinedStrength(1, 0.2), 1.972069],
      ['0.30', computeConfinedStrength(1, 0.3), 2.291154],
    ])
  })

  it('has the numbers of a spiral column', () => {
    const ke = computeEffectiveness('spiral', 64, ds, rhoCc)
    const fl = computeConfiningStress(ke, rhoS, 420)
    const fcc = computeConfinedStrength(35, fl)
    const epsCc = computeConfinedPeakStrain(0.002, 35, fcc)
    const curve = createManderCurve(fcc, epsCc, Ec)
    expectAll(mander, 'circle 1200, spiral 16 at 80', [
      ['rhoS', rhoS, 0.009274074],
      ['ke', ke, 0.9912106],
      ['fl', fl, 1.930438],
      ['fcc', fcc, 46.84918],
      ['epsCc', epsCc, 0.005385479],
      ['r', curve.r, 1.416602],
      ['f(0.001)', computeManderStress(curve, 0.001), 24.22604],
      ['f(0.004)', computeManderStress(curve, 0.004), 45.94862],
      ['f(0.01)', computeManderStress(curve, 0.01), 43.70614],
      ['f(0.02)', computeManderStress(curve, 0.02), 36.07789],
    ])
    expectAll('Priestley, Seible & Calvi 1996, from memory', 'epsSu 0.12 and 0.10', [
      ['epsCu 0.12', computeUltimateStrain(rhoS, 420, 0.12, fcc), 0.01796777],
      ['epsCu 0.10', computeUltimateStrain(rhoS, 420, 0.1, fcc), 0.01563981],
    ])
    const hoops = computeEffectiveness('hoop', 64, ds, rhoCc)
    expectAll(mander, 'the same as hoops', [
      ['ke', hoops, 0.9619498],
      ['fcc', computeConfinedStrength(35, computeConfiningStress(hoops, rhoS, 420)), 46.53693],
    ])
    const lens = computeConfinedStrength(35, 2 * fl)
    expectAll('sum of ring pressures, derived', 'overlap of two such spirals', [
      ['fcc', lens, 56.43781],
      ['epsCc', computeConfinedPeakStrain(0.002, 35, lens), 0.008125088],
    ])
  })

  it('weighs one turn of spiral over its pitch', () => {
    expectAll(
      'helix of diameter 1084 and pitch 80, 7850 kg/m3 (EN 1991-1-1, from memory), by hand',
      'bar 201.0619 mm2',
      [
        ['spiral', computeMassPerLength('spiral', 201.0619, ds, 80), 0.0672060556],
        ['hoop', computeMassPerLength('hoop', 201.0619, ds, 80), 0.0671875194],
      ],
    )
  })

  it('has the unconfined curve with its straight line', () => {
    const law = createUnconfinedCurve(35, 0.002, Ec, 0.006)
    expectAll(mander, 'fco 35, spalling strain 0.006', [
      ['r', law.curve.r, 2.448628],
      ['f(0.001)', computeUnconfinedStress(law, 0.001), 26.25975],
      ['f(0.0035)', computeUnconfinedStress(law, 0.0035), 27.85052],
      ['f(0.004)', computeUnconfinedStress(law, 0.004), 24.81384],
      ['f(0.005)', computeUnconfinedStress(law, 0.005), 12.40692],
      ['f(0.006)', computeUnconfinedStress(law, 0.006), 0],
    ])
  })
})

describe('steel', () => {
  it('hardens by the power law', () => {
    const law = createPlateauHardening(469, 2e5, 655, 0.0115, (2 * (655 - 469)) / (0.09 - 0.0115), 0.09)
    expectAll('Mander 1984, power 2, from memory', 'fy 469, fu 655, epsSh 0.0115, epsSu 0.09', [
      ['f(0.03)', computePlateauHardeningStress(law, 0.03), 546.33839],
      ['f(0.05)', computePlateauHardeningStress(law, 0.05), 606.70595],
      ['f(0.09)', computePlateauHardeningStress(law, 0.09), 655],
    ])
  })

  it('loads first by Menegotto-Pinto', () => {
    const stress = (eps: number) => computeMenegottoPintoStress(420, 2e5, 0.01, 20, eps)
    expectAll('Menegotto & Pinto 1973, from memory', 'fy 420, b 0.01, R0 20', [
      ['s(0.001)', stress(0.001), 199.999996],
      ['s(0.0021)', stress(0.0021), 405.836326],
      ['s(0.005)', stress(0.005), 425.8],
      ['s(-0.01)', stress(-0.01), -435.8],
    ])
  })
})

describe('overlaps and idealised curves', () => {
  it('has the areas of circular lenses', () => {
    expectAll('closed form of two circular segments', 'R 542 at 0.5, 0.6, 0.75 D; R 500 and 200 at 550', [
      ['0.5 D', computeLensArea(542, 542, 542), 360850.8],
      ['0.6 D', computeLensArea(542, 542, 650.4), 262798.5],
      ['0.75 D', computeLensArea(542, 542, 813), 133166.7],
      ['unequal', computeLensArea(500, 200, 550), 38520.88],
    ])
  })

  it('has the equal-area moments', () => {
    const states = [
      { kind: 'bar-yield-tension' as const, item: 'L', curvature: 0.002, moment: 2000, axialStrain: 0 },
    ]
    const straight = { curvature: [0, 0.002, 0.006, 0.05, 0.1], moment: [0, 2000, 2800, 3200, 3100] }
    const bent = { curvature: [0, 0.0003, 0.002, 0.006, 0.05, 0.1], moment: [0, 600, 2000, 2800, 3200, 3100] }
    const Mp = (rule: 'equal-area-beyond-yield' | 'equal-area-from-zero', curve: typeof bent) =>
      idealiseCurve(rule, curve, states, true).yieldMoment ?? Number.NaN
    expectAll('bridge practice, from memory; areas by hand', 'five points', [
      ['beyond yield', Mp('equal-area-beyond-yield', straight), 3057.749],
      ['from zero', Mp('equal-area-from-zero', straight), 3057.749],
      ['bent, beyond yield', Mp('equal-area-beyond-yield', bent), 3057.749],
      ['bent, from zero', Mp('equal-area-from-zero', bent), 3060.844],
    ])
  })
})
