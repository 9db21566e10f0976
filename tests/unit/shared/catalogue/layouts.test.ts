import { describe, expect, it } from 'vitest'
import { demoJobs } from '#shared/catalogue/demo.ts'
import { layouts } from '#shared/catalogue/layouts.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import { analyse } from '#workers/solver/analyse.ts'
import {
  listBarGaps,
  listCovers,
  listInterlocks,
  listLooseBars,
  listWireGaps,
} from '../../../helpers/buildability.ts'
import { readSound } from '../../../helpers/fixtureDocuments.ts'

const sections = [
  ...layouts.map((layout) => [layout.title, layout.create()] as const),
  ...demoJobs[0].sections.map((section) => [section.title, section.document] as const),
]

describe.each(sections)('%s can be built', (_title, input) => {
  const { section } = readSound(input)

  it('every bar lies against the inside of its spiral', () => {
    expect(section.bars.length).toBeGreaterThan(0)
    expect(listLooseBars(section)).toEqual([])
  })

  it('no bar comes nearer than 5 mm to a wire that it does not belong to', () => {
    for (const { bar, spiral, gap } of listWireGaps(section)) {
      expect(gap, `bar at (${bar.x}, ${bar.y}), wire of ${spiral}`).toBeGreaterThanOrEqual(5)
    }
  })

  it('bars stand max(1.5 d, 40 mm) apart', () => {
    const gaps = listBarGaps(section)
    expect(gaps.length).toBeGreaterThan(200)
    for (const { clear, asked } of gaps) expect(clear).toBeGreaterThanOrEqual(asked)
  })

  it('spirals have 50 mm of cover or more', () => {
    for (const cover of listCovers(section)) expect(cover).toBeGreaterThanOrEqual(50 - 1e-9)
  })

  it('an interlock holds four bars or more and its wires mesh', () => {
    // Benzoni, Priestley & Seible 2000 (12th World Conf. Earthquake Eng., paper 1562)
    for (const { pair, bars, pitches } of listInterlocks(section)) {
      expect(bars, pair).toBeGreaterThanOrEqual(4)
      const ratio = Math.max(...pitches) / Math.min(...pitches)
      expect(Math.abs(ratio - Math.round(ratio)), pair).toBeLessThan(1e-9)
    }
  })

  it('clear pitch 25 to 75 mm: ACI 318-19 25.7.3.1 (from memory)', () => {
    for (const { pitch, barDiameter } of section.spirals) {
      expect(pitch - barDiameter).toBeGreaterThanOrEqual(25)
      expect(pitch - barDiameter).toBeLessThanOrEqual(75)
    }
  })

  it("volumetric ratio 0.12 f'c / f_yh on the out-to-out core: ACI 318-19 18.7.5.4 (from memory)", () => {
    const { materials } = readSound(input)
    for (const { id, barArea, diameter, barDiameter, pitch, steel } of section.spirals) {
      const ratio = (4 * barArea) / ((diameter + barDiameter) * pitch)
      const { specified } = materials.concrete
      const yieldStrength = materials.steels[steel].specified?.yieldStrength
      if (!specified || !yieldStrength) throw new Error(`Specified strengths stand in ${id}; found none`)
      expect(ratio, id).toBeGreaterThanOrEqual((0.12 * specified.strength) / yieldStrength)
    }
  })

  it('gives a curve without warnings of clash, spacing or interlock', () => {
    const reply = analyse(input)
    expect(reply.status).toBe('solved')
    const codes = reply.status === 'solved' ? reply.result.warnings.map((warning) => warning.code) : []
    // What stays is not of the layout: overlaps are beyond tests wherever they are.
    expect(codes.filter((code) => code !== 'overlap-untested')).toEqual([])
  })
})

describe('layouts', () => {
  it('are one spiral, two interlocking, centre and four corners', () => {
    expect(layouts.map((layout) => [layout.id, layout.create().section.spirals?.length])).toEqual([
      ['one-spiral', 1],
      ['two-interlocking', 2],
      ['five-spirals', 5],
    ])
  })

  it('have a short title and one sentence', () => {
    for (const { title, description } of layouts) {
      expect(title.length).toBeLessThan(40)
      expect(description).toMatch(/^[A-Z][^.!?]*(\d\.\d[^.!?]*)*\.$/)
    }
  })

  it('make a document of their own each time', () => {
    const [layout] = layouts
    const first = layout.create()
    first.section.spirals = []
    expect(readDocument(layout.create())).not.toEqual(readDocument(first))
  })
})

describe('the check itself', () => {
  it('finds bars of the centre ring at the wires of the corners where they stand on the diagonals', () => {
    const document = layouts[2].create()
    const [centreRing] = document.section.bars ?? []
    if (centreRing.layout.kind !== 'ring')
      throw new Error('The centre bars stand in a ring; found another layout')
    centreRing.layout.startAngle = 90 + 3.5
    expect(listWireGaps(readSound(document).section).filter(({ gap }) => gap < 5).length).toBeGreaterThan(0)
  })
})
