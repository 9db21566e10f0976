import { describe, expect, it } from 'vitest'
import type { Issue } from '#shared/document/analysisDocument.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { AnalysisDocumentInput } from '#shared/document/schema.ts'
import { loadInput } from '../../../helpers/fixtureDocuments.ts'

type SteelInput = AnalysisDocumentInput['materials']['steels'][string]
type Concrete = AnalysisDocumentInput['materials']['concrete']

function read(change: (document: AnalysisDocumentInput) => void): Issue[] {
  const document = loadInput('one-spiral')
  change(document)
  const outcome = readDocument(document)
  return outcome.status === 'bad' ? outcome.issues : []
}

const withConcrete = (concrete: Partial<Concrete>) =>
  read(({ materials }) => Object.assign(materials.concrete, concrete))
const withSteel = (steel: SteelInput) =>
  read(({ materials }) => {
    materials.steels.L = steel
  })

describe('concrete that is refused', () => {
  it('a spalling strain that does not exceed twice the strain at peak', () => {
    expect(withConcrete({ peakStrain: 0.0025, spallingStrain: 0.005 })).toEqual([
      {
        path: 'materials.concrete.spallingStrain',
        code: 'spalling-strain',
        message: 'must exceed twice the strain at peak stress',
        found: '0.005',
        allowed: 'more than 0.005',
      },
    ])
    expect(withConcrete({ peakStrain: 0.0024, spallingStrain: 0.005 })).toEqual([])
  })

  it('a modulus that does not exceed the secant to the peak', () => {
    expect(withConcrete({ modulus: 20_000 })).toEqual([
      {
        path: 'materials.concrete.modulus',
        code: 'modulus',
        message: 'must exceed strength over strain at peak stress, or the curve cannot rise to its peak',
        found: '20000 MPa',
        allowed: 'more than 20000 MPa',
      },
    ])
    expect(withConcrete({ modulus: 20_001 })).toEqual([])
    // 5000 sqrt(f'co) meets f'co / 0.002 at 100 MPa.
    expect(withConcrete({ strength: 100 })).toMatchObject([{ path: 'materials.concrete.modulus' }])
    expect(withConcrete({ strength: 99 })).toEqual([])
  })
})

describe('steels that are refused', () => {
  const menegotto = { law: 'menegotto-pinto', yieldStrength: 460 } as const

  it('menegotto-pinto without a ratio and without what it derives from', () => {
    const cases: [Partial<SteelInput>, string][] = [
      [{}, 'nothing'],
      [{ tensileStrength: 600 }, 'tensileStrength only'],
      [{ strainAtMaximumStress: 0.1 }, 'strainAtMaximumStress only'],
    ]
    for (const [given, found] of cases) {
      expect(withSteel({ ...menegotto, ...given } as SteelInput)).toEqual([
        {
          path: 'materials.steels.L.hardeningRatio',
          code: 'missing',
          message: 'is needed, or else both tensileStrength and strainAtMaximumStress',
          found,
          allowed: 'a number from 0 to 0.5',
        },
      ])
    }
  })

  it('menegotto-pinto whose tensile strength lies below yield', () => {
    expect(withSteel({ ...menegotto, tensileStrength: 440, strainAtMaximumStress: 0.1 })).toMatchObject([
      {
        path: 'materials.steels.L.tensileStrength',
        code: 'hardening-ratio',
        found: expect.stringMatching(/^ratio -0\.001/),
        allowed: 'a ratio from 0 to 0.5',
      },
    ])
    // A ratio that is given wins.
    expect(
      withSteel({ ...menegotto, tensileStrength: 440, strainAtMaximumStress: 0.1, hardeningRatio: 0 }),
    ).toEqual([])
  })

  it('menegotto-pinto with a1 not below r0', () => {
    expect(withSteel({ ...menegotto, hardeningRatio: 0.01, r0: 18 })).toMatchObject([
      { path: 'materials.steels.L.a1', code: 'branch-shape', found: '18.5', allowed: 'less than 18' },
    ])
  })

  it('strains that do not exceed the yield strain', () => {
    const steel: SteelInput = {
      law: 'elastic-plastic',
      yieldStrength: 460,
      limitStrain: 0.0023,
      strainAtMaximumStress: 0.002,
    }
    expect(withSteel(steel)).toEqual([
      {
        path: 'materials.steels.L.limitStrain',
        code: 'strain-order',
        message: 'must exceed the yield strain',
        found: '0.0023',
        allowed: 'more than 0.0023',
      },
      {
        path: 'materials.steels.L.strainAtMaximumStress',
        code: 'strain-order',
        message: 'must exceed the yield strain',
        found: '0.002',
        allowed: 'more than 0.0023',
      },
    ])
  })

  it('plateau-hardening out of order', () => {
    const steel = {
      law: 'plateau-hardening',
      yieldStrength: 460,
      tensileStrength: 600,
      hardeningStrain: 0.01,
      hardeningModulus: 5000,
      strainAtMaximumStress: 0.1,
    } as const
    expect(withSteel(steel)).toEqual([])
    expect(withSteel({ ...steel, tensileStrength: 460 })).toMatchObject([
      {
        path: 'materials.steels.L.tensileStrength',
        code: 'strength-order',
        found: '460 MPa',
        allowed: 'more than 460 MPa',
      },
    ])
    expect(withSteel({ ...steel, hardeningStrain: 0.002 })).toMatchObject([
      { path: 'materials.steels.L.hardeningStrain', found: '0.002', allowed: 'at least 0.0023' },
    ])
    expect(withSteel({ ...steel, hardeningStrain: 0.1 })).toMatchObject([
      { path: 'materials.steels.L.hardeningStrain', found: '0.1', allowed: 'less than 0.1' },
    ])
  })

  it('a spiral of a steel without strain at maximum stress', () => {
    const issues = read(({ materials }) => {
      materials.steels.T = { law: 'elastic-plastic', yieldStrength: 420 }
    })
    expect(issues).toEqual([
      {
        path: 'materials.steels.T.strainAtMaximumStress',
        code: 'missing',
        message: 'is needed of a steel that spirals are made of',
        found: 'nothing',
        allowed: 'the uniform elongation, for example 0.09',
      },
    ])
  })

  it('bars of a steel without it are sound: then there is no rupture limit', () => {
    expect(withSteel({ law: 'elastic-plastic', yieldStrength: 460 })).toEqual([])
  })
})

describe('cases and loads that are refused', () => {
  const cases = [
    { name: 'permanent', axialLoad: 5e6, angle: -90 },
    { name: 'greatest', axialLoad: 7e6 },
  ]
  const analysis = (fields: object) =>
    read((document) => {
      document.cases = structuredClone(cases)
      document.analysis = { kind: 'moment-curvature', ...fields }
    })

  it('no load and no case', () => {
    expect(analysis({})).toEqual([
      {
        path: 'analysis.axialLoad',
        code: 'missing',
        message: 'is missing',
        found: 'nothing',
        allowed: 'a number in N, compression positive, or the name of a case in analysis.case',
      },
    ])
  })

  it('a case that is not defined', () => {
    expect(analysis({ case: 'least' })).toEqual([
      {
        path: 'analysis.case',
        code: 'unknown-case',
        message: 'names a case that is not defined',
        found: '"least"',
        allowed: '"permanent", "greatest"',
      },
    ])
    const without = read((document) => {
      document.analysis = { kind: 'moment-curvature', case: 'least' }
    })
    expect(without).toMatchObject([{ code: 'unknown-case', allowed: 'nothing, since no case is defined' }])
  })

  it('a load or an angle beside a case that says otherwise', () => {
    expect(analysis({ case: 'permanent', axialLoad: 6e6, angle: 0 })).toEqual([
      {
        path: 'analysis.axialLoad',
        code: 'case-differs',
        message: 'differs from the case "permanent" that the analysis names',
        found: '6000000',
        allowed: '5000000, or nothing',
      },
      {
        path: 'analysis.angle',
        code: 'case-differs',
        message: 'differs from the case "permanent" that the analysis names',
        found: '0',
        allowed: '270, or nothing',
      },
    ])
    expect(analysis({ case: 'permanent', axialLoad: 5e6, angle: 270 })).toEqual([])
  })

  it('two cases of one name', () => {
    const issues = read((document) => {
      document.cases = [...cases, { name: 'greatest', axialLoad: 1 }]
    })
    expect(issues).toMatchObject([
      { path: 'cases[2].name', code: 'duplicate', message: 'stands twice, first at cases[1].name' },
    ])
  })

  it('no finite load is refused, however large or tensile', () => {
    for (const axialLoad of [-1e12, -0, 1e300]) expect(analysis({ axialLoad })).toEqual([])
  })
})
