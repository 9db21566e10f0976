import { describe, expect, it } from 'vitest'
import { steelGrades } from '#shared/catalogue/steels.ts'
import { loadInput, readSound } from '../../../helpers/fixtureDocuments.ts'

const create = (id: string, barDiameter: number) => {
  const grade = steelGrades.find((one) => one.id === id)
  if (!grade) throw new Error(`The grade ${id} stands in the catalogue; found none`)
  return grade.create(barDiameter)
}

describe('grades of steel', () => {
  it('have names of their own and a source', () => {
    expect(new Set(steelGrades.map((grade) => grade.id)).size).toBe(steelGrades.length)
    for (const grade of steelGrades) expect(grade.source).toMatch(/\(.*memory.*\)/)
  })

  it.each(steelGrades.map((grade) => [grade.id, grade] as const))(
    '%s reads without issue for every size, as steel of bars and of spirals',
    (_id, grade) => {
      for (const barDiameter of [6, 10, 16, 25, 29, 32, 36, 43, 57]) {
        const document = loadInput('one-spiral')
        document.materials.steels = { L: grade.create(barDiameter), T: grade.create(barDiameter) }
        expect(readSound(document).materials.steels.L.yieldStrength).toBeGreaterThan(400)
      }
    },
  )

  // AASHTO Guide Specifications for LRFD Seismic Bridge Design, Table 8.4.2-1 (from memory): ksi of 6.894757 MPa.
  it.each([
    ['a706-60-expected', 16, 0.015, 0.12, 0.09],
    ['a706-60-expected', 25.4, 0.015, 0.12, 0.09],
    ['a706-60-expected', 28.65, 0.0125, 0.12, 0.09],
    ['a706-60-expected', 32.26, 0.0115, 0.12, 0.09],
    ['a706-60-expected', 35.81, 0.0115, 0.09, 0.06],
    ['a706-60-expected', 43, 0.0075, 0.09, 0.06],
    ['a706-60-expected', 57.33, 0.005, 0.09, 0.06],
    ['a615-60-expected', 25.4, 0.015, 0.09, 0.06],
    ['a615-60-expected', 35.81, 0.0115, 0.06, 0.04],
  ])('%s, bar of %s mm', (id, barDiameter, hardeningStrain, strainAtMaximumStress, limitStrain) => {
    const steel = create(id, barDiameter)
    expect(steel).toMatchObject({
      law: 'plateau-hardening',
      hardeningStrain,
      strainAtMaximumStress,
      limitStrain,
      specified: { yieldStrength: 420 },
    })
    if (steel.law !== 'plateau-hardening') throw new Error(`A plateau is asked for; found ${steel.law}`)
    expect(steel.yieldStrength).toBeCloseTo(68 * 6.894757, 1)
    expect(steel.tensileStrength).toBeCloseTo(95 * 6.894757, 1)
    // p = Esh (epsU - epsSh) / (fu - fy) = 2
    const rise = steel.tensileStrength - steel.yieldStrength
    const exponent = (steel.hardeningModulus * (strainAtMaximumStress - hardeningStrain)) / rise
    expect(exponent).toBeCloseTo(2, 7)
  })

  it('A706 Grade 80 by Overby, Kowalsky & Seracino 2017 (from memory)', () => {
    expect(create('a706-80-expected', 25)).toMatchObject({
      hardeningStrain: 0.0074,
      strainAtMaximumStress: 0.0954,
      limitStrain: 0.06,
      specified: { yieldStrength: 550, tensileStrength: 690 },
    })
  })

  it('B500: least values of EN 1992-1-1 Annex C, mean values of EN 1998-2 Annex E (from memory)', () => {
    expect(create('b500b-specified', 25)).toMatchObject({ yieldStrength: 500, tensileStrength: 540 })
    expect(create('b500b-expected', 25)).toMatchObject({
      yieldStrength: 575,
      tensileStrength: 648,
      strainAtMaximumStress: 0.05,
    })
    expect(create('b500c-specified', 25)).toMatchObject({ yieldStrength: 500, tensileStrength: 575 })
    expect(create('b500c-expected', 25)).toMatchObject({
      yieldStrength: 575,
      tensileStrength: 690,
      strainAtMaximumStress: 0.075,
    })
  })
})
