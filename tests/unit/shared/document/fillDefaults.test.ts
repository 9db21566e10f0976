import { describe, expect, it } from 'vitest'
import {
  computeDefaultBarArea,
  computeDefaultLimitStrain,
  computeDefaultModulus,
  computeHardeningRatio,
  roundDerived,
  toPlainAngle,
} from '#shared/document/fillDefaults.ts'
import { fixtureNames, loadFixture, loadInput, readSound } from '../../../helpers/fixtureDocuments.ts'

describe('filling defaults', () => {
  it.each(fixtureNames)('%s reads to the document filled by hand, field for field', (name) => {
    expect(readSound(loadInput(name))).toStrictEqual(loadFixture(`${name}.filled`))
  })

  it('optional objects without a default stay absent', () => {
    const filled = readSound(loadInput('one-spiral'))
    expect(Object.keys(filled).sort()).toEqual(['analysis', 'cases', 'format', 'materials', 'section'])
    expect(filled.materials.concrete).not.toHaveProperty('specified')
    expect(filled.materials.steels.L).not.toHaveProperty('specified')
    expect(filled.analysis).not.toHaveProperty('case')
    const bare = loadInput('one-spiral')
    bare.section.spirals = []
    bare.materials.steels.L = { law: 'elastic-plastic', yieldStrength: 460 }
    expect(readSound(bare).materials.steels.L).toStrictEqual({
      law: 'elastic-plastic',
      yieldStrength: 460,
      modulus: 200_000,
      buckling: { kind: 'none' },
    })
  })

  it('absent lists become empty ones', () => {
    const { materials, analysis } = loadInput('one-spiral')
    const filled = readSound({ section: { outline: { kind: 'circle', diameter: 500 } }, materials, analysis })
    expect(filled.section).toEqual({
      outline: { kind: 'circle', diameter: 500 },
      voids: [],
      spirals: [],
      bars: [],
    })
    expect(filled.cases).toEqual([])
  })

  it('a chamfer, a start angle and a lining have their defaults', () => {
    const document = loadInput('one-spiral')
    document.section.outline = { kind: 'rectangle', width: 1300, depth: 1300 }
    document.section.voids = [{ kind: 'circle', centre: [0, 0], diameter: 100 }]
    const { section } = readSound(document)
    expect(section.outline).toEqual({ kind: 'rectangle', width: 1300, depth: 1300, chamfer: 0 })
    expect(section.voids[0].lining).toBe(false)
    expect(section.bars[0].layout).toMatchObject({ startAngle: 90 })
  })

  it('the case that the analysis names gives load and angle, its name stays', () => {
    const document = loadInput('one-spiral')
    document.cases = [
      { name: 'a', axialLoad: 1 },
      { name: 'b', axialLoad: -2e6, angle: 765 },
    ]
    document.analysis = { kind: 'moment-curvature', case: 'b' }
    expect(readSound(document).analysis).toMatchObject({ case: 'b', axialLoad: -2e6, angle: 45 })
  })

  it('a hardening ratio that is given wins over the tensile strength', () => {
    const document = loadInput('format-1')
    expect(readSound(document).materials.steels.L).toMatchObject({
      hardeningRatio: 0.008,
      tensileStrength: 600,
    })
  })
})

describe('derived defaults, to nine significant digits', () => {
  it('bar area pi d² / 4', () => {
    expect(computeDefaultBarArea(16)).toBe(201.06193)
    expect(computeDefaultBarArea(200)).toBe(31415.9265)
  })

  it("modulus 5000 sqrt(f'co); Mander, Priestley & Park 1988 (from memory)", () => {
    expect(computeDefaultModulus(35)).toBe(29580.3989)
    expect(computeDefaultModulus(36)).toBe(30_000)
  })

  it('limit strain 0.75 of the strain at maximum stress', () => {
    expect(computeDefaultLimitStrain(0.12)).toBe(0.09)
    expect(computeDefaultLimitStrain(0.0954)).toBe(0.07155)
  })

  it('hardening ratio: the second branch meets the tensile strength at its strain', () => {
    const [fy, fu, epsU, Es] = [460, 630, 0.1, 200_000]
    const ratio = computeHardeningRatio(fy, fu, epsU, Es)
    expect(ratio).toBe(0.00870010235)
    // On the asymptote through (fy / Es, fy) with slope ratio x Es.
    expect(fy + ratio * Es * (epsU - fy / Es)).toBeCloseTo(fu, 5)
  })

  it('rounding keeps what is short and cuts what is long', () => {
    expect(roundDerived(0.1)).toBe(0.1)
    expect(roundDerived(1 / 3)).toBe(0.333333333)
    expect(roundDerived(123456789.4)).toBe(123456789)
  })
})

describe('angles', () => {
  it.each([
    [0, 0],
    [-0, 0],
    [360, 0],
    [-360, 0],
    [720, 0],
    [-1e-20, 0],
    [359.9, 359.9],
    [-90, 270],
    [405, 45],
    [-337.5, 22.5],
    [-36000, 0],
  ])('%s degrees is %s', (angle, plain) => {
    expect(toPlainAngle(angle)).toBe(plain)
  })

  it('one that lies in the circle already keeps its digits', () => {
    for (const angle of [0.1, 1e-9, 7.3, 22.5, 359.99999999]) expect(toPlainAngle(angle)).toBe(angle)
  })
})
