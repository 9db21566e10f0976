import { describe, expect, it } from 'vitest'
import type { LimitState } from '#shared/document/analysisResult.ts'
import { computeEqualAreaMoment, idealiseCurve } from '#workers/solver/analyses/idealise.ts'

const curve = { curvature: [0, 2, 6, 50, 100], moment: [0, 200, 280, 320, 310] }

function reached(kind: LimitState['kind'], curvature: number, moment: number): LimitState {
  return { kind, curvature, moment, axialStrain: 0 }
}

const yields = reached('bar-yield-tension', 2, 200)
const nominal = reached('concrete-0.004', 6, 280)

describe('by first yield and nominal', () => {
  it('takes yield on the line through first yield at the nominal moment', () => {
    const idealised = idealiseCurve('first-yield-nominal', curve, [yields, nominal], true)
    expect(idealised).toEqual({
      rule: 'first-yield-nominal',
      firstYieldCurvature: 2,
      firstYieldMoment: 200,
      yieldCurvature: 2.8,
      yieldMoment: 280,
      ultimateCurvature: 100,
      ultimateMoment: 310,
      ductility: 100 / 2.8,
    })
  })

  it('takes whichever comes first of the two states for either', () => {
    const states = [reached('concrete-0.002', 1.5, 160), yields, reached('bar-0.015', 5, 270), nominal]
    const idealised = idealiseCurve('first-yield-nominal', curve, states, true)
    expect([idealised.firstYieldCurvature, idealised.yieldMoment]).toEqual([1.5, 270])
  })

  it('leaves empty what was not reached', () => {
    const none = idealiseCurve('first-yield-nominal', curve, [], true)
    expect([none.firstYieldCurvature, none.yieldMoment, none.ultimateCurvature]).toEqual([null, null, 100])
    const noNominal = idealiseCurve('first-yield-nominal', curve, [yields], true)
    expect([noNominal.firstYieldMoment, noNominal.yieldMoment, noNominal.ductility]).toEqual([
      200,
      null,
      null,
    ])
    const brokenOff = idealiseCurve('first-yield-nominal', curve, [yields, nominal], false)
    expect([brokenOff.yieldCurvature, brokenOff.ultimateCurvature, brokenOff.ductility]).toEqual([
      2.8,
      null,
      null,
    ])
  })

  it('gives nothing from yield on where first yield is at zero curvature', () => {
    const idealised = idealiseCurve(
      'first-yield-nominal',
      curve,
      [reached('concrete-0.002', 0, 0), nominal],
      true,
    )
    expect(idealised).toMatchObject({
      firstYieldCurvature: 0,
      yieldCurvature: null,
      yieldMoment: null,
      ultimateCurvature: null,
      ultimateMoment: null,
      ductility: null,
    })
  })
})

describe('by equal areas', () => {
  it('has the area of the curve', () => {
    // Trapezoids by hand.
    const area = (2 * 200) / 2 + (4 * 480) / 2 + (44 * 600) / 2 + (50 * 630) / 2
    for (const rule of ['equal-area-from-zero', 'equal-area-beyond-yield'] as const) {
      const plastic = computeEqualAreaMoment(rule, curve, 2, 200)!
      const yieldAt = plastic / 100
      expect((yieldAt * plastic) / 2 + (100 - yieldAt) * plastic).toBeCloseTo(area, 8)
    }
  })

  it('is not there for a curve with more area than any such line can have', () => {
    const steep = { curvature: [0, 0.1, 2, 3], moment: [0, 500, 500, 500] }
    expect(computeEqualAreaMoment('equal-area-from-zero', steep, 2, 200)).toBeNull()
  })

  it('is not made of a curve that was broken off', () => {
    const idealised = idealiseCurve('equal-area-from-zero', curve, [yields], false)
    expect([idealised.yieldMoment, idealised.ductility]).toEqual([null, null])
  })
})
