import { describe, expect, it } from 'vitest'
import { computeOutlineArea } from '#shared/geometry/outline.ts'
import {
  axialForce,
  axialTangent,
  bendingTangent,
  computeCrossMoment,
  computeResultants,
  couplingTangent,
  moment,
  resultantCount,
} from '#workers/solver/section/resultants.ts'
import { createSectionModel, type SectionModel } from '#workers/solver/section/sectionModel.ts'
import {
  createCircleDocument,
  createCornerSpiralsDocument,
  createRing,
  plateau,
} from '../../../../helpers/sampleSections.ts'
import { readSound } from '../../../../helpers/solve.ts'

function createModel(input: unknown, strips?: number): SectionModel {
  const document = readSound(input)
  return createSectionModel(
    document,
    computeOutlineArea(document.section.outline),
    strips === undefined ? {} : { strips },
  )
}

function resultantsOf(model: SectionModel, eps0: number, kappa: number): Float64Array {
  const out = new Float64Array(resultantCount)
  computeResultants(model, eps0, kappa, out)
  return out
}

/**
 * Strain states (at the reference point, curvature times 1 m) from elastic to far past spalling. None has a kink of a law
 * exactly on the pole of a circle, where the width and with it the tangent moves like a square root.
 */
const states = [
  [2e-4, 0],
  [8e-4, 1e-3],
  [3e-4, 3e-3],
  [-1e-3, 0.0123],
  [-2e-3, 0.03],
  [4e-3, 0.01],
  [-8e-3, 0.06],
].map(([eps0, curvature]) => ({ eps0, kappa: curvature / 1000 }))

const models = {
  circle: createModel(createCircleDocument()),
  'plateau steel and hoops': createModel(createCircleDocument({ steels: { L: plateau } })),
  'corner spirals at 30 degrees': createModel(createCornerSpiralsDocument({ analysis: { angle: 30 } })),
  'no spiral': createModel(createCircleDocument({ section: { spirals: [] } })),
}

describe.each(Object.entries(models))('resultants of %s', (_, model) => {
  it('have their numerical derivatives as tangent', () => {
    for (const { eps0, kappa } of states) {
      const at = resultantsOf(model, eps0, kappa)
      const stepEps = 1e-8
      const stepKappa = 1e-8 / 500
      const d = (place: number, e: number, k: number, step: number) =>
        (resultantsOf(model, eps0 + e, kappa + k)[place] - resultantsOf(model, eps0 - e, kappa - k)[place]) /
        (2 * step)
      const size = Math.abs(resultantsOf(model, 1e-4, 0)[axialTangent])
      // A hundredth of a per cent of the elastic stiffness; bars that change from elastic to plastic are the reason.
      const near = (got: number, wanted: number, scale: number) =>
        expect(Math.abs(got - wanted) / scale, `eps0 ${eps0}, kappa ${kappa}`).toBeLessThan(1e-4)
      near(d(axialForce, stepEps, 0, stepEps), at[axialTangent], size)
      near(d(moment, stepEps, 0, stepEps), at[couplingTangent], size * 500)
      if (kappa === 0) continue
      near(d(axialForce, 0, stepKappa, stepKappa), at[couplingTangent], size * 500)
      near(d(moment, 0, stepKappa, stepKappa), at[bendingTangent], size * 500 * 500)
    }
  })

  it('change smoothly while spalling wanders through the strips', () => {
    // Second differences of N over strain stay small against its change: a jump of a strip would show.
    const kappa = 2e-5
    const step = 2e-5
    const forces = Array.from(
      { length: 400 },
      (_, i) => resultantsOf(model, -4e-3 + i * step, kappa)[axialForce],
    )
    const change = Math.max(...forces) - Math.min(...forces)
    for (let i = 2; i < forces.length; i++) {
      expect(Math.abs(forces[i] - 2 * forces[i - 1] + forces[i - 2]) / change).toBeLessThan(2e-3)
    }
  })
})

describe('uniform strain', () => {
  it('gives each law on its own area, bars in place of concrete', () => {
    const { circle } = models
    const eps = 0.0012
    const concrete = circle.concretes.reduce(
      (sum, { law, area }) => sum + law.computeStress(eps) * area.reduce((total, one) => total + one, 0),
      0,
    )
    const confined = circle.zones.find((zone) => zone.spirals.length === 1)!.law
    // The stress of the steel is below its yield strength of 460 MPa.
    const barArea = 16 * ((Math.PI * 25 * 25) / 4)
    const bars =
      barArea * (circle.steels[0].table ? 200_000 * eps : 0) - barArea * confined.computeStress(eps)
    expect(resultantsOf(circle, eps, 0)[axialForce] / (concrete + bars)).toBeCloseTo(1, 4)
    expect(Math.abs(resultantsOf(circle, eps, 0)[moment])).toBeLessThan(1)
  })

  it('has no concrete in tension, and none beyond spalling without a spiral', () => {
    const bare = models['no spiral']
    const tension = resultantsOf(bare, -0.001, 0)[axialForce]
    expect(tension).toBeCloseTo(-16 * ((Math.PI * 25 * 25) / 4) * 200, -3)
    const spalled = resultantsOf(bare, 0.008, 0)[axialForce]
    expect(spalled).toBeCloseTo(-resultantsOf(bare, -0.008, 0)[axialForce], 3)
  })
})

describe('the moment about the other axis', () => {
  it('is zero for a symmetric section and the one missing bar times its arm for another', () => {
    expect(computeCrossMoment(models.circle, 1e-3, 1e-6)).toBe(0)
    const group = { layout: { kind: 'points', points: [[200, 0]] }, barDiameter: 20, steel: 'L' }
    const lopsided = createModel(
      createCircleDocument({ section: { spirals: [], bars: [createRing([0, 0], 840, 16), group] } }),
    )
    // At v = 0 the strain is eps0 alone: in tension only the bar acts.
    const cross = computeCrossMoment(lopsided, -5e-4, 0)
    expect(cross / (-200_000 * 5e-4 * ((Math.PI * 20 * 20) / 4) * 200)).toBeCloseTo(1, 6)
  })

  it('turns its sign with the mirrored section', () => {
    const at = (angle: number) =>
      computeCrossMoment(createModel(createCornerSpiralsDocument({ analysis: { angle } })), 1e-4, 5e-6)
    expect(at(20)).not.toBe(0)
    // The section but for the ring of fourteen bars is symmetric about both axes; with it, only this pair is told apart.
    expect(Math.sign(at(20))).not.toBe(Math.sign(at(-20)))
  })
})
