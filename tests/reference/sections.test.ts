/**
 * Three sections with results of an independent strip integration (interval arithmetic on exact chords, two-point Gauss,
 * refined until moments move by less than 2e-5); see tests/fixtures/sections/README.md.
 */
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { expectReference } from '../helpers/referenceTable.ts'
import { findLimitState, interpolateMoment, solve } from '../helpers/solve.ts'

interface SectionCase {
  document: Record<string, unknown> & { title: string }
  expected: {
    spirals: { id: string; rhoS: number; ke: number; fl: number; fcc: number; epsCc: number; epsCu: number }[]
    zones: { spirals: string[]; area: number; fl: number; fcc: number; epsCc: number }[]
    limitStates: Record<string, { curvature: number; moment: number }>
    samples: { curvature: number; moment: number }[]
  }
}

const source = 'independent strip integration of the same laws'
const kinds: Record<string, string> = {
  'cover-0.002': 'concrete-0.002',
  'cover-0.004': 'concrete-0.004',
  'cover-spalling': 'spalling',
}

function readCase(name: string): SectionCase {
  return JSON.parse(readFileSync(new URL(`../fixtures/sections/${name}.json`, import.meta.url), 'utf8'))
}

describe.each(['p1-circular-spiral', 'p2-circular-hoops-plateau-steel', 'p3-five-spiral-square'])(
  '%s',
  (name) => {
    const { document, expected } = readCase(name)
    const solution = solve(document)

    it('has the confinement of every spiral and zone', () => {
      for (const wanted of expected.spirals) {
        const got = solution.spirals.find((spiral) => spiral.id === wanted.id)!
        const pairs = [
          ['volumetricRatio', got.volumetricRatio, wanted.rhoS],
          ['effectiveness', got.effectiveness, wanted.ke],
          ['confiningStress', got.confiningStress, wanted.fl],
          ['confinedStrength', got.confinedStrength, wanted.fcc],
          ['peakStrain', got.peakStrain, wanted.epsCc],
          ['ultimateStrain', got.ultimateStrain, wanted.epsCu],
        ] as const
        for (const [quantity, gotValue, wantedValue] of pairs) {
          expectReference({
            id: `${name} spiral ${wanted.id} ${quantity}`,
            source,
            inputs: document.title,
            got: gotValue,
            wanted: wantedValue,
            tolerance: 1e-5,
            reason: 'closed forms',
          })
        }
      }
      expect(solution.zones).toHaveLength(expected.zones.length)
      for (const wanted of expected.zones) {
        const got = solution.zones.find((zone) => zone.spirals.join() === wanted.spirals.join())!
        for (const [quantity, gotValue, wantedValue, tolerance] of [
          ['area', got.area, wanted.area, 2e-3],
          ['strength', got.strength, wanted.fcc, 1e-5],
          ['peakStrain', got.peakStrain, wanted.epsCc, 1e-5],
        ] as const) {
          expectReference({
            id: `${name} zone [${wanted.spirals.join()}] ${quantity}`,
            source,
            inputs: document.title,
            got: gotValue,
            wanted: wantedValue,
            tolerance,
            reason: quantity === 'area' ? 'contract: zones exact to 0.2 % of area' : 'closed forms',
          })
        }
      }
    })

    it('has the moments of the samples and the curvatures of the limit states', () => {
      for (const sample of expected.samples) {
        expectReference({
          id: `${name} moment at ${sample.curvature.toExponential(4)}`,
          source,
          inputs: document.title,
          got: interpolateMoment(solution, sample.curvature),
          wanted: sample.moment,
          tolerance: 2e-3,
          reason: 'contract: interpolated between rows within 0.2 %',
        })
      }
      for (const [key, wanted] of Object.entries(expected.limitStates)) {
        const [kind, item] = key.split(':')
        const got = findLimitState(solution, kinds[kind] ?? kind, item)
        expectReference({
          id: `${name} ${key} curvature`,
          source,
          inputs: document.title,
          got: got.curvature,
          wanted: wanted.curvature,
          tolerance: 5e-3,
          reason: 'where the curve is flat a small moment moves the curvature',
        })
        expectReference({
          id: `${name} ${key} moment`,
          source,
          inputs: document.title,
          got: got.moment,
          wanted: wanted.moment,
          tolerance: 2e-3,
          reason: 'contract: 0.2 %',
        })
      }
    })

    it('does not move under refinement', () => {
      const fine = solve(document, 800)
      expect(fine.stop).toEqual(solution.stop)
      for (const state of fine.limitStates) {
        const coarse = findLimitState(solution, state.kind, state.item)
        expectReference({
          id: `${name} ${state.kind} refined`,
          source: 'the same laws on strips ten times as fine',
          inputs: document.title,
          got: coarse.moment,
          wanted: state.moment,
          tolerance: 3e-5,
          reason: 'the reference itself moves by 2e-5',
        })
      }
    })
  },
)

describe('p1 with a void', () => {
  const { document } = readCase('p1-circular-spiral')
  const withVoid = (diameter: number) => {
    const section = document.section as Record<string, unknown>
    return solve({
      ...document,
      section: { ...section, voids: [{ kind: 'circle', centre: [0, 0], diameter }] },
    })
  }

  it('of 600 mm ends by the spiral', () => {
    expect(withVoid(600).stop.reason).toBe('spiral-fracture')
  })

  it('of 800 mm ends at the face of the void', () => {
    expect(withVoid(800).stop).toEqual({ reason: 'void-face', item: '0' })
  })
})
