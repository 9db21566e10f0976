import { describe, expect, it } from 'vitest'
import {
  createCircleDocument,
  createCornerSpiralsDocument,
  createRing,
  createSpiral,
  longitudinal,
  transverse,
} from '../../../../helpers/sampleSections.ts'
import { solve } from '../../../../helpers/solve.ts'

function warningsOf(document: unknown) {
  return solve(document).warnings
}
function codesOf(document: unknown): string[] {
  return warningsOf(document).map((warning) => warning.code)
}

const sound = createCircleDocument()
/** Two spirals of 600 mm at a centre distance, with or without bars in their interlock. */
const interlocking = (distance: number, pitches: [number, number] = [80, 80], barsBetween = true) => {
  const half = distance / 2
  const rise = 200
  return createCircleDocument({
    section: {
      outline: { kind: 'oblong', width: 1300, depth: 760 },
      spirals: [
        createSpiral('S1', [-half, 0], 600, pitches[0]),
        createSpiral('S2', [half, 0], 600, pitches[1]),
      ],
      bars: barsBetween
        ? [
            {
              layout: {
                kind: 'points',
                points: [
                  [20, rise],
                  [-20, -rise],
                  [-40, 0],
                  [40, 0],
                ],
              },
              barDiameter: 16,
              steel: 'L',
            },
          ]
        : [createRing([0, 0], 40, 1)],
    },
  })
}

describe('warnings', () => {
  it('of a plain circle with one spiral: none', () => {
    expect(codesOf(sound)).toEqual([])
  })

  it('name the place and the numbers', () => {
    const [warning] = warningsOf(createCircleDocument({ concrete: { strength: 71 } }))
    expect(warning).toMatchObject({ code: 'concrete-out-of-range', path: 'materials.concrete.strength' })
    expect(warning.message).toContain('71 MPa')
    expect(warning.message).toContain('60 MPa')
  })

  it.each([
    ['concrete-out-of-range', createCircleDocument({ concrete: { strength: 19 } })],
    [
      'spiral-steel-out-of-range',
      createCircleDocument({ steels: { T: { ...transverse, yieldStrength: 501 } } }),
    ],
    [
      'elongation-large',
      createCircleDocument({ steels: { L: { ...longitudinal, strainAtMaximumStress: 0.13 } } }),
    ],
    ['clear-spacing', createCircleDocument({ section: { spirals: [createSpiral('S1', [0, 0], 880, 90)] } })],
    ['clear-spacing', createCircleDocument({ section: { spirals: [createSpiral('S1', [0, 0], 880, 38)] } })],
    [
      'void-idles-spiral',
      createCircleDocument({ section: { voids: [{ kind: 'circle', centre: [0, 0], diameter: 720 }] } }),
    ],
    ['unconfined', createCircleDocument({ section: { spirals: [] } })],
    ['no-bars', createCircleDocument({ section: { bars: [] } })],
    ['bar-unrestrained', createCircleDocument({ section: { bars: [createRing([0, 0], 300, 6)] } })],
    ['bar-spacing', createCircleDocument({ section: { bars: [createRing([0, 0], 841, 50)] } })],
    ['bar-on-wire', createCircleDocument({ section: { bars: [createRing([0, 0], 880, 12)] } })],
    ['single-direction', createCornerSpiralsDocument()],
    ['interlock-distance', interlocking(250)],
    ['interlock-distance', interlocking(480)],
    ['interlock-distance-large', interlocking(400)],
    ['interlock-bars', interlocking(350, [80, 80], false)],
    ['pitches-do-not-mesh', interlocking(350, [80, 70])],
    ['overlap-untested', interlocking(350)],
    ['no-equilibrium', createCircleDocument({ analysis: { axialLoad: 1e12 } })],
  ])('%s', (code, document) => {
    expect(codesOf(document)).toContain(code)
    expect(codesOf(sound)).not.toContain(code)
  })

  it('are not given just inside a limit', () => {
    const fits = createCircleDocument({
      concrete: { strength: 60 },
      steels: {
        T: { ...transverse, yieldStrength: 500 },
        L: { ...longitudinal, strainAtMaximumStress: 0.12 },
      },
      section: { spirals: [createSpiral('S1', [0, 0], 880, 89)] },
    })
    expect(codesOf(fits)).toEqual([])
    expect(codesOf(interlocking(360))).not.toContain('interlock-distance-large')
    expect(codesOf(interlocking(360, [80, 40]))).not.toContain('pitches-do-not-mesh')
  })

  it('of one direction go when the cases have two', () => {
    const cases = [
      { name: 'along', axialLoad: 1e6, angle: 0 },
      { name: 'across', axialLoad: 1e6, angle: 90 },
    ]
    expect(codesOf({ ...createCornerSpiralsDocument(), cases })).not.toContain('single-direction')
  })
})
