import { describe, expect, it } from 'vitest'
import { findFace } from '@/drawing/compressedSide.ts'
import { createNeutralAxis, findNeutralAxis } from '@/drawing/neutralAxis.ts'
import { createStrainDiagram, listYielded } from '@/drawing/strainDiagram.ts'
import { createFrame, createHollowOctagon, createLayoutSection } from '../../../helpers/drawnSections.ts'

const section = createLayoutSection('five-spirals')
const frame = createFrame(section.outline)
/** strain(v) = axialStrain + curvature v: 0.005 at the top (v = 750 mm), zero 375 mm under it. */
const state = { curvature: 0.005 / 375, axialStrain: -0.005, label: 'state 4' }

describe('findNeutralAxis', () => {
  it('lies where the strain is zero', () => {
    expect(findNeutralAxis(section.outline, 0, state)).toBeCloseTo(375, 9)
  })

  it('is none without curvature or outside the outline', () => {
    expect(findNeutralAxis(section.outline, 0, { ...state, curvature: 0 })).toBeNull()
    expect(findNeutralAxis(section.outline, 0, { ...state, axialStrain: 0.02 })).toBeNull()
  })
})

describe('createNeutralAxis', () => {
  it('runs level through section and diagram when the top is compressed', () => {
    const axis = createNeutralAxis(section.outline, frame, 0, 375)
    expect(axis.y1).toBeCloseTo(frame.view.y(375), 9)
    expect(axis.y2).toBe(axis.y1)
    expect(axis.x1).toBeLessThan(frame.left)
    expect(axis.x2).toBeGreaterThan(frame.diagramLeft!)
  })

  it('stands upright when the left is compressed, and askew in between, within its overhang', () => {
    const upright = createNeutralAxis(section.outline, frame, 90, 375)
    expect(upright.x1).toBeCloseTo(frame.view.x(-375), 6)
    expect(upright.x2).toBeCloseTo(frame.view.x(-375), 6)
    const askew = createNeutralAxis(section.outline, frame, 45, 375)
    // The compressed side is the upper left, so the axis rises to the right.
    expect((askew.y2 - askew.y1) / (askew.x2 - askew.x1)).toBeCloseTo(-1, 6)
    for (const x of [askew.x1, askew.x2]) {
      expect(x).toBeGreaterThanOrEqual(frame.left - 17)
      expect(x).toBeLessThanOrEqual(frame.right + 17)
    }
  })
})

describe('createStrainDiagram', () => {
  it('writes the strains at the compressed face and at the farthest bar, and the depth', () => {
    const diagram = createStrainDiagram(section, frame, 0, state)!
    expect(diagram.peak.text).toBe('+0.00500')
    // Lowest bars of the corner rings: 485 + 173.9... see the layout; the strain is linear.
    expect(diagram.far.name).toBe('lowest bar')
    expect(diagram.far.text.startsWith('−0.0')).toBe(true)
    expect(diagram.depth?.text).toBe('375')
    expect(diagram.neutralY).toBeCloseTo(frame.view.y(375), 9)
  })

  it('hangs when the bottom is compressed', () => {
    const diagram = createStrainDiagram(section, frame, 180, state)!
    expect(diagram.far.name).toBe('highest bar')
    expect(diagram.neutralY).toBeCloseTo(frame.view.y(-375), 9)
    expect(diagram.captionY).toBeGreaterThan(diagram.peak.y)
  })

  it('fits the height of the section askew', () => {
    const diagram = createStrainDiagram(section, frame, 45, state)!
    expect(diagram.aligned).toBe(false)
    expect(diagram.axisBottom - diagram.axisTop).toBeCloseTo(frame.bottom - frame.top, 6)
  })

  it('is all on one side when the whole section is compressed', () => {
    const diagram = createStrainDiagram(section, frame, 0, { ...state, curvature: 0, axialStrain: 0.001 })!
    expect(diagram.depth).toBeNull()
    expect(diagram.neutralY).toBeNull()
    expect(diagram.compressed).not.toBe('')
    expect(`${diagram.profile}${diagram.compressed}${diagram.layers}`).not.toContain('NaN')
  })

  it('is none where there is no room for it', () => {
    expect(createStrainDiagram(section, createFrame(section.outline, 600), 0, state)).toBeNull()
  })
})

describe('listYielded', () => {
  it('tells bars past yield by the strain at their centres, in either sense', () => {
    const one = createLayoutSection('one-spiral')
    const [first] = one.bars
    const points = [
      [0, 500],
      [0, 200],
      [0, 0],
      [0, -500],
    ] as [number, number][]
    const bars = [{ ...first, layout: { kind: 'points' as const, points } }]
    // 1e-5 per mm about the middle: strains 0.005, 0.002, 0, -0.005 against 0.0023.
    const yielded = listYielded(
      { ...one, bars },
      0,
      { curvature: 1e-5, axialStrain: 0, label: '' },
      { L: 0.0023 },
    )
    expect(yielded).toEqual([true, false, false, true])
  })

  it('takes bars of an unknown steel as elastic', () => {
    expect(listYielded(section, 0, state, {}).some(Boolean)).toBe(false)
  })
})

describe('findFace', () => {
  it('finds the face on a line through a point', () => {
    expect(findFace(section.outline, [100, 0], [0, 1])[1]).toBeCloseTo(750, 6)
    // On the chamfer: x + y = 750 + 690.
    expect(findFace(section.outline, [720, 0], [0, 1])[1]).toBeCloseTo(720, 6)
    expect(findFace(createHollowOctagon().outline, [0, 0], [-1, 0])[0]).toBeCloseTo(-693, 6)
  })
})
