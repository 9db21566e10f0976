import { describe, expect, it } from 'vitest'
import {
  createCircleDocument,
  createCornerSpiralsDocument,
  createRing,
  createSpiral,
  plateau,
  transverse,
} from '../../../../helpers/sampleSections.ts'
import { findLimitState, solve } from '../../../../helpers/solve.ts'

describe('where a curve ends', () => {
  it('at the fracture of the spiral, when its edge reaches its ultimate strain', () => {
    const { stop, points, spirals } = solve(createCircleDocument())
    expect(stop).toEqual({ reason: 'spiral-fracture', item: 'S1' })
    expect(points.spiralStrain.S1.at(-1)! / spirals[0].ultimateStrain).toBeCloseTo(1, 7)
  })

  it('at the rupture of a bar where that comes first', () => {
    const { stop, points } = solve(
      createCircleDocument({ steels: { L: { ...plateau, limitStrain: 0.01 } }, analysis: { axialLoad: 0 } }),
    )
    expect(stop).toEqual({ reason: 'bar-rupture', item: 'L' })
    expect(points.barStrainTension.at(-1)! / -0.01).toBeCloseTo(1, 7)
  })

  it('at the first of several spirals that fracture together, in the order of the document', () => {
    const twins = [createSpiral('Z', [-200, 0], 500), createSpiral('A', [200, 0], 500)]
    const { stop, limitStates } = solve(
      createCircleDocument({ section: { spirals: twins, bars: [createRing([0, 0], 260)] } }),
    )
    expect(stop).toEqual({ reason: 'spiral-fracture', item: 'Z' })
    const ties = limitStates.filter((state) => state.kind === 'spiral-fracture')
    expect(ties.map((state) => state.item)).toEqual(['Z', 'A'])
    expect(new Set(ties.map((state) => state.curvature)).size).toBe(1)
  })

  it('past spirals and bars when the drop of the moment is asked for', () => {
    const { stop, points, limitStates } = solve(
      createCircleDocument({ analysis: { endAt: 'moment-drop-20', axialLoad: 1e7 } }),
    )
    expect(stop.reason).toBe('moment-drop-20')
    expect(limitStates.map((state) => state.kind)).toContain('spiral-fracture')
    expect(points.moment.at(-1)! / Math.max(...points.moment)).toBeCloseTo(0.8, 6)
  })

  it('at a curvature of 0.25 over the depth when nothing else happens', () => {
    const { stop, points, idealised, warnings } = solve(
      createCircleDocument({
        section: { spirals: [{ ...createSpiral('S1', [0, 0], 880, 40), barDiameter: 20 }] },
        steels: {
          L: { law: 'elastic-plastic', yieldStrength: 460 },
          T: { ...transverse, strainAtMaximumStress: 0.15 },
        },
        analysis: { axialLoad: 0 },
      }),
    )
    expect(stop).toEqual({ reason: 'curvature-limit' })
    expect(points.curvature.at(-1)).toBeCloseTo(0.25 / 1000, 15)
    expect(idealised.ultimateCurvature).toBeNull()
    expect(warnings.map((warning) => warning.code)).toContain('no-limit-reached')
  })

  it('where the moment is gone under a load without spirals', () => {
    const { stop, points } = solve(
      createCircleDocument({ section: { spirals: [] }, analysis: { axialLoad: 1e7 } }),
    )
    expect(stop).toEqual({ reason: 'moment-lost' })
    expect(Math.abs(points.moment.at(-1)!) / Math.max(...points.moment)).toBeLessThan(1e-6)
  })

  it('at the fold of the branch, not past it, however fine the strips', () => {
    // Steel that is gone past its strain at maximum stress leaves the load to softening concrete.
    const document = createCircleDocument({
      steels: { L: plateau },
      analysis: { endAt: 'moment-drop-20' },
    })
    const ends = [undefined, 140, 400, 420, 800].map((strips) => {
      const { stop, points } = solve(document, strips)
      expect(stop).toEqual({ reason: 'no-equilibrium' })
      return points.curvature.at(-1)!
    })
    expect(Math.max(...ends) / Math.min(...ends) - 1).toBeLessThan(1e-3)
  })

  it('before it begins under a load beyond all strength, without rows', () => {
    for (const axialLoad of [1e12, -1e12]) {
      const { stop, points, limitStates, idealised } = solve(
        createCircleDocument({ analysis: { axialLoad } }),
      )
      expect(stop).toEqual({ reason: 'no-equilibrium' })
      expect(points.curvature).toEqual([])
      expect(points.spiralStrain.S1).toEqual([])
      expect(limitStates).toEqual([])
      expect(idealised.firstYieldCurvature).toBeNull()
    }
  })
})

describe('limit states', () => {
  it('stand in the order of curvature, with the greatest moment of the curve among them', () => {
    const { limitStates, points } = solve(createCornerSpiralsDocument())
    const curvatures = limitStates.map((state) => state.curvature)
    expect(curvatures).toEqual([...curvatures].sort((a, b) => a - b))
    const peak = limitStates.filter((state) => state.kind === 'peak-moment')
    expect(peak).toHaveLength(1)
    expect(peak[0].moment).toBe(Math.max(...points.moment))
  })

  it('hold their strain', () => {
    const solution = solve(createCircleDocument())
    const rowOf = (kind: string) =>
      solution.points.curvature.indexOf(findLimitState(solution, kind).curvature)
    for (const [kind, strain] of [
      ['concrete-0.002', 0.002],
      ['concrete-0.003', 0.003],
      ['concrete-0.004', 0.004],
      ['spalling', 0.005],
    ] as const) {
      expect(solution.points.concreteStrain[rowOf(kind)] / strain).toBeCloseTo(1, 7)
    }
    expect(solution.points.barStrainTension[rowOf('bar-yield-tension')]! / -0.0023).toBeCloseTo(1, 7)
    expect(solution.points.barStrainTension[rowOf('bar-0.015')]! / -0.015).toBeCloseTo(1, 7)
  })

  it('already passed at zero curvature stand there', () => {
    const solution = solve(createCircleDocument({ analysis: { axialLoad: 3.1e7 } }))
    expect(solution.points.axialStrain[0]).toBeGreaterThan(0.002)
    expect(findLimitState(solution, 'concrete-0.002').curvature).toBe(0)
  })
})

describe('degenerate sections', () => {
  it('without any load and bar have no moment to speak of', () => {
    const { points, stop } = solve(
      createCircleDocument({ section: { spirals: [], bars: [] }, analysis: { axialLoad: 0 } }),
    )
    // A millionth of f'co D^3 is 32 kN·mm; rounding leaves less.
    expect(Math.max(...points.moment.map(Math.abs))).toBeLessThan(1e4)
    expect(['no-equilibrium', 'moment-lost', 'curvature-limit']).toContain(stop.reason)
    expect(points.barStrainTension.every((strain) => strain === null)).toBe(true)
  })

  it('with neither bars nor tension strength carry no tension', () => {
    const { points } = solve(
      createCircleDocument({ section: { spirals: [], bars: [] }, analysis: { axialLoad: -1 } }),
    )
    expect(points.curvature).toEqual([])
  })
})
