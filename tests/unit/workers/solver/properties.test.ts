/** What holds for every section. Seeded, so that a failure comes back; `npm run soak:solver` draws many more. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import {
  solveMomentCurvature,
  type MomentCurvatureSolution,
} from '#workers/solver/analyses/momentCurvature.ts'
import {
  createCircleDocument,
  createCornerSpiralsDocument,
  createSpiral,
} from '../../../helpers/sampleSections.ts'
import { sectionArbitrary } from '../../../helpers/sectionArbitrary.ts'
import { interpolateMoment, readSound, solve } from '../../../helpers/solve.ts'
import { findFault, solveTimed } from '../../../helpers/solverFaults.ts'

const seed = 20

/** Moments of two curves of equal ends, at shares of the curvature: greatest difference over the greatest moment. */
function compareCurves(one: MomentCurvatureSolution, other: MomentCurvatureSolution): number {
  const end = Math.min(one.points.curvature.at(-1)!, other.points.curvature.at(-1)!)
  const greatest = Math.max(...one.points.moment)
  const shares = Array.from({ length: 40 }, (_, i) => (i + 1) / 40)
  return Math.max(
    ...shares.map(
      (share) =>
        Math.abs(interpolateMoment(one, share * end) - interpolateMoment(other, share * end)) / greatest,
    ),
  )
}

function expectSameEnd(one: MomentCurvatureSolution, other: MomentCurvatureSolution, tolerance: number) {
  expect(other.stop.reason).toBe(one.stop.reason)
  const ratio = other.points.curvature.at(-1)! / one.points.curvature.at(-1)!
  expect(Math.abs(ratio - 1)).toBeLessThan(tolerance)
}

describe('random sections', () => {
  it('give finite ordered rows in equilibrium, a stated end that refinement does not move, and no exception', () => {
    fc.assert(
      fc.property(sectionArbitrary, (document) => {
        expect(findFault(document, solveTimed(document))).toBeNull()
      }),
      { seed, numRuns: 150 },
    )
  }, 60_000)
})

/** Every place of a section turned about the origin by degrees, counter-clockwise; outline as polygon. */
function turn(document: AnalysisDocument, degrees: number): unknown {
  const radians = (degrees * Math.PI) / 180
  const move = ([x, y]: readonly [number, number]): [number, number] => [
    x * Math.cos(radians) - y * Math.sin(radians),
    x * Math.sin(radians) + y * Math.cos(radians),
  ]
  return relocate(document, move, (angle) => angle + degrees)
}

/** Left and right changed over. */
function mirror(document: AnalysisDocument): unknown {
  return relocate(
    document,
    ([x, y]) => [-x, y],
    (angle) => -angle,
  )
}

function relocate(
  { section, materials, analysis }: AnalysisDocument,
  move: (point: readonly [number, number]) => [number, number],
  turnAngle: (angle: number) => number,
) {
  const { outline } = section
  if (outline.kind !== 'polygon') throw new Error('The sample is a polygon')
  return {
    section: {
      outline: { kind: 'polygon', points: outline.points.map(move) },
      voids: section.voids.map((hole) => ({ ...hole, centre: move(hole.centre) })),
      spirals: section.spirals.map((spiral) => ({ ...spiral, centre: move(spiral.centre) })),
      bars: section.bars.map(({ layout, ...bar }) => {
        if (layout.kind !== 'points') throw new Error('The sample has bars at points')
        return { ...bar, layout: { kind: 'points', points: layout.points.map(move) } }
      }),
    },
    materials,
    analysis: { ...analysis, angle: turnAngle(analysis.angle) },
  }
}

describe('turning and mirroring', () => {
  const lopsided = readSound(
    createCircleDocument({
      section: {
        outline: {
          kind: 'polygon',
          points: [
            [-700, -500],
            [600, -500],
            [700, 300],
            [100, 620],
            [-650, 500],
          ],
        },
        voids: [{ kind: 'circle', centre: [150, 0], diameter: 120, lining: true }],
        spirals: [createSpiral('S1', [-180, 0], 800), createSpiral('S2', [260, -40], 700, 90)],
        bars: [
          {
            layout: {
              kind: 'points',
              points: [
                [-540, 0],
                [-180, 360],
                [-180, -360],
                [260, 270],
                [260, -350],
                [570, -40],
                [40, 240],
              ],
            },
            barDiameter: 32,
            steel: 'L',
          },
        ],
      },
      analysis: { axialLoad: 4e6, angle: 25 },
    }),
  )
  const plain = solveMomentCurvature(lopsided)

  it.each([90, 33.3, 180, -71])('by %d degrees changes nothing but the angle', (degrees) => {
    const turned = solve(turn(lopsided, degrees))
    expectSameEnd(plain, turned, 1e-6)
    expect(compareCurves(plain, turned)).toBeLessThan(1e-5)
    turned.points.crossMoment.forEach((cross, i) => {
      const greatest = Math.max(...plain.points.moment)
      expect(Math.abs(cross - plain.points.crossMoment[i]) / greatest).toBeLessThan(1e-5)
    })
  })

  it('changes the sign of the cross moment alone when left and right change over', () => {
    const mirrored = solve(mirror(lopsided))
    expectSameEnd(plain, mirrored, 1e-6)
    expect(compareCurves(plain, mirrored)).toBeLessThan(1e-5)
    const last = plain.points.crossMoment.at(-1)!
    expect(mirrored.points.crossMoment.at(-1)! / last).toBeCloseTo(-1, 4)
  })

  it('moves nothing when the origin moves', () => {
    const moved = solve(
      relocate(
        lopsided,
        ([x, y]) => [x + 5000, y - 3000],
        (angle) => angle,
      ),
    )
    expectSameEnd(plain, moved, 1e-6)
    expect(compareCurves(plain, moved)).toBeLessThan(1e-5)
  })
})

describe('circles in special places', () => {
  const withSpirals = (spirals: unknown[], overlap = 'sum') =>
    solve(createCircleDocument({ section: { spirals }, confinement: { overlap } }))
  const single = withSpirals([createSpiral('S1', [0, 0], 880)])

  it('that coincide confine by the sum, or by the larger', () => {
    const pair = [createSpiral('S1', [0, 0], 880), createSpiral('S2', [0, 0], 880)]
    const sum = withSpirals(pair)
    expect(sum.zones.map((zone) => zone.spirals)).toEqual([[], ['S1', 'S2']])
    expect(sum.zones[1].confiningStress).toBeCloseTo(2 * single.zones[1].confiningStress, 10)
    const largest = withSpirals(pair, 'largest')
    expectSameEnd(single, largest, 1e-12)
    expect(compareCurves(single, largest)).toBeLessThan(1e-9)
  })

  it('that touch have no zone between them', () => {
    const touching = [createSpiral('S1', [-220, 0], 440), createSpiral('S2', [220, 0], 440)]
    const solution = withSpirals(touching)
    expect(solution.zones.map((zone) => zone.spirals)).toEqual([[], ['S1'], ['S2']])
    const near = withSpirals([createSpiral('S1', [-219.999, 0], 440), touching[1]])
    expectSameEnd(solution, near, 1e-4)
    expect(compareCurves(solution, near)).toBeLessThan(1e-4)
  })
})

describe('the strips', () => {
  it.each([
    ['circle', createCircleDocument()],
    ['corner spirals', createCornerSpiralsDocument()],
    ['corner spirals at 22.5 degrees', createCornerSpiralsDocument({ analysis: { angle: 22.5 } })],
    ['high load', createCornerSpiralsDocument({ analysis: { axialLoad: 2e7 } })],
    ['no load', createCircleDocument({ analysis: { axialLoad: 0 } })],
    ['tension', createCircleDocument({ analysis: { axialLoad: -1.5e6 } })],
  ])('are fine enough: %s', (_, document) => {
    const coarse = solve(document)
    const fine = solve(document, 280)
    expectSameEnd(coarse, fine, 1e-3)
    expect(compareCurves(coarse, fine)).toBeLessThan(2e-4)
  })
})

describe('the rows', () => {
  it.each([
    ['circle', createCircleDocument()],
    ['corner spirals', createCornerSpiralsDocument()],
    ['no load', createCircleDocument({ analysis: { axialLoad: 0 } })],
    ['high load', createCircleDocument({ analysis: { axialLoad: 1.2e7 } })],
  ])('are dense enough for straight lines, by 0.2 %: %s', (_, document) => {
    const few = solve({ ...document, analysis: { ...document.analysis, points: 200 } })
    const many = solve({ ...document, analysis: { ...document.analysis, points: 2000 } })
    const { curvature, moment } = many.points
    const greatest = Math.max(...moment)
    const end = few.points.curvature.at(-1)!
    const misses = curvature.flatMap((kappa, i) =>
      kappa > end
        ? []
        : [
            Math.abs(interpolateMoment(few, kappa) - moment[i]) /
              Math.max(Math.abs(moment[i]), 0.05 * greatest),
          ],
    )
    expect(Math.max(...misses)).toBeLessThan(2e-3)
  })
})
