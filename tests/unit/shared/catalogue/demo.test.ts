import { describe, expect, it } from 'vitest'
import { demoJobs } from '#shared/catalogue/demo.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { analyse } from '#workers/solver/analyse.ts'
import { readSound } from '../../../helpers/fixtureDocuments.ts'

const [ternCreek, measured] = demoJobs

describe('Tern Creek Crossing', () => {
  it('has three columns: one spiral, five, two', () => {
    expect(ternCreek.title).toBe('Tern Creek Crossing')
    expect(ternCreek.sections.map((section) => section.document.section.spirals?.length)).toEqual([1, 5, 2])
    expect(ternCreek.sections.map((section) => section.title)).toEqual([
      'Pier 2 column, one spiral',
      'Pier 3 column, five spirals',
      'Pier 4 column, two interlocking spirals',
    ])
  })

  it.each(ternCreek.sections.map((section) => [section.title, section.document] as const))(
    "%s: expected strengths and axial loads of 0.08 to 0.15 f'c Ag",
    (_title, input) => {
      const { section, materials, cases } = readSound(input)
      expect(materials.strengthBasis).toBe('expected')
      expect(new Set(cases.map((one) => one.axialLoad)).size).toBeGreaterThanOrEqual(2)
      for (const { axialLoad } of cases) {
        const ratio = axialLoad / (materials.concrete.strength * computeOutlineArea(section.outline))
        expect(ratio).toBeGreaterThan(0.08)
        expect(ratio).toBeLessThan(0.15)
      }
      if (section.outline.kind !== 'circle') {
        expect(new Set(cases.map((one) => one.angle)).size).toBeGreaterThanOrEqual(2)
      }
    },
  )
})

describe('measured columns', () => {
  // Rows of the performance database: longitudinal and spiral ratio in per cent, P / (f'c Ag), greatest base moment in kN·m.
  it.each([
    { place: 0, rhoL: 2.427, rhoS: 0.762, axialRatio: 0.227, moment: 880.4 },
    { place: 1, rhoL: 1.497, rhoS: 0.716, axialRatio: 0.072, moment: 696.7 },
  ])('section $place is the column of its database row', ({ place, rhoL, rhoS, axialRatio, moment }) => {
    const input = measured.sections[place].document
    const { section, materials, analysis, notes } = readSound(input)
    const area = computeOutlineArea(section.outline)
    const barArea = placeBars(section.bars).reduce((sum, bar) => sum + bar.area, 0)
    const [spiral] = section.spirals
    expect(materials.strengthBasis).toBe('measured')
    // Ratios of the row are printed to four, three and three figures.
    expect((100 * barArea) / area).toBeCloseTo(rhoL, 2)
    expect((400 * spiral.barArea) / (spiral.diameter * spiral.pitch)).toBeCloseTo(rhoS, 2)
    expect(analysis.axialLoad / (materials.concrete.strength * area)).toBeCloseTo(axialRatio, 2)
    expect(notes?.measuredPeakMoment).toBe(`${moment} kN·m, mean of both directions`)
    expect(notes?.reference).toContain('Berry, Parrish & Eberhard 2004')
    expect(notes?.modelling).toContain('assumed')

    // Models of this kind give 0.81 to 1.20 of the measured moments over 21 columns of the database, mean 0.96.
    const reply = analyse(input)
    if (reply.status !== 'solved') throw new Error(`A measured column has a curve; found ${reply.status}`)
    const ratio = Math.max(...reply.result.points.moment) / (moment * 1e6)
    expect(ratio).toBeGreaterThan(0.81)
    expect(ratio).toBeLessThan(1.2)
  })

  it('the octagon is regular', () => {
    const { outline } = measured.sections[0].document.section
    if (outline.kind !== 'polygon') throw new Error(`The octagon is a polygon; found ${outline.kind}`)
    const sides = outline.points.map(([x, y], i) => {
      const [nextX, nextY] = outline.points[(i + 1) % outline.points.length]
      return Math.hypot(nextX - x, nextY - y)
    })
    expect(sides).toHaveLength(8)
    // 600 tan(22.5°), corners to 0.001 mm
    for (const side of sides) expect(side).toBeCloseTo(248.528, 2)
  })
})
