import { describe, expect, it } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { Section } from '#shared/document/analysisDocument.ts'
import { createAnnotations, type Annotations } from '@/drawing/annotations.ts'
import type { Selection } from '@/drawing/selection.ts'
import { computeLabelOffsets } from '@/drawing/spiralLabels.ts'
import { doBoxesMeet, type Box } from '@/drawing/textBox.ts'
import { createFrame, createHollowOctagon, createLayoutSection } from '../../../helpers/drawnSections.ts'

interface Options {
  width?: number
  angle?: number
  compact?: boolean
  selection?: Selection | null
}

function annotate(
  section: Section,
  { width = 776, angle = 0, compact = false, selection = null }: Options = {},
) {
  const frame = createFrame(section.outline, width, angle, compact)
  const offsets = computeLabelOffsets(section, frame.view)
  const annotations = createAnnotations({
    section,
    frame,
    angle,
    arrowSide: -1,
    offsets,
    selection,
    neutralAxis: null,
    hint: [],
  })
  return { annotations, frame, offsets }
}

function listWords({ dimensions, arrow, chamfer, labels, notes, tag }: Annotations): Box[] {
  return [
    ...dimensions.map((line) => line.box),
    ...(arrow?.boxes.slice(1) ?? []),
    ...(chamfer ? [chamfer.box] : []),
    ...labels.map((label) => label.box),
    ...notes.map((note) => note.box),
    ...(tag ? [tag.box] : []),
  ]
}

const sections: [string, Section][] = [
  ...layouts.map(({ id }): [string, Section] => [id, createLayoutSection(id)]),
  ['hollow octagon', createHollowOctagon()],
]
const widths = [345, 600, 688, 776]
const angles = [0, 22.5, 45, 90, 135, 180, 270, 315]

describe('createAnnotations', () => {
  it.each(sections)(
    'keeps all words of %s apart and on the paper, at every width and direction',
    (_, section) => {
      for (const width of widths) {
        for (const angle of angles) {
          const { annotations, frame } = annotate(section, { width, angle })
          const words = listWords(annotations)
          for (const [i, box] of words.entries()) {
            expect(box.left).toBeGreaterThanOrEqual(0)
            expect(box.right).toBeLessThanOrEqual(frame.width)
            expect(box.top).toBeGreaterThanOrEqual(0)
            expect(box.bottom).toBeLessThanOrEqual(frame.height)
            for (const other of words.slice(i + 1)) {
              expect({ width, angle, meet: doBoxesMeet(box, other) }).toEqual({ width, angle, meet: false })
            }
          }
        }
      }
    },
  )

  it('dimensions the square: outer sizes, places of the corner spirals, least cover', () => {
    const { annotations } = annotate(createLayoutSection('five-spirals'))
    const numbers = Object.fromEntries(annotations.dimensions.map(({ key, text }) => [key, text]))
    expect(numbers).toEqual({ x0: '265', x1: '970', x2: '265', width: '1500', depth: '1500', cover: '50' })
    expect(annotations.chamfer?.lines.map((line) => line.text)).toEqual(['60 × 60', '4 chamfers'])
  })

  it('tells places from the middle too once they are no longer alike', () => {
    const section = createLayoutSection('five-spirals')
    const [C, K1, ...rest] = section.spirals
    const { annotations } = annotate({ ...section, spirals: [C, { ...K1, centre: [385, 485] }, ...rest] })
    const chain = annotations.dimensions.filter(({ key }) => /^x\d/.test(key)).map(({ text }) => text)
    expect(chain).toEqual(['265', '485', '385', '100', '265'])
  })

  it('writes a circle by its diameter once', () => {
    const { annotations } = annotate(createLayoutSection('one-spiral'))
    expect(annotations.dimensions.map(({ text }) => text).sort()).toEqual(['50', 'Ø1200'])
    expect(annotations.labels[0].lines).toEqual(['Ø1084', '16 bar at 70'])
  })

  it('tells how far a wire stands out, in red', () => {
    const section = createLayoutSection('one-spiral')
    const out = { ...section, spirals: [{ ...section.spirals[0], diameter: 1210 }] }
    const cover = annotate(out).annotations.dimensions.find(({ key }) => key === 'cover')
    // (1210 + 16 - 1200) / 2
    expect(cover).toMatchObject({ text: '13', tone: 'fault' })
    expect(cover?.word?.text).toBe('outside')
  })

  it('names spirals of one make and overlaps with leaders', () => {
    const { annotations } = annotate(createLayoutSection('two-interlocking'))
    const notes = annotations.notes.map(({ lines }) =>
      lines.map(({ strong, text }) => `${strong} ${text}`.trim()),
    )
    expect(notes).toEqual([['W, E Ø1084, 16 bar at 70'], ['overlap', '434']])
  })

  it('gives the distances of a selected spiral and its tag, and drops its name', () => {
    const { annotations } = annotate(createLayoutSection('five-spirals'), {
      selection: { kind: 'spiral', id: 'K1' },
    })
    const chosen = annotations.dimensions.filter(({ tone }) => tone === 'selected')
    expect(chosen.map(({ text }) => text)).toEqual(['485', '485'])
    expect(annotations.tag?.lines).toEqual([{ strong: 'K1', text: 'Ø400, 12 bar at 80' }])
    expect(annotations.labels.map(({ id }) => id)).toEqual(['C', 'K2', 'K3', 'K4'])
    expect(listWords(annotations).length).toBeGreaterThan(8)
  })

  it('has only the outer dimension and leaders when it is compact', () => {
    const { annotations } = annotate(createLayoutSection('five-spirals'), { width: 345, compact: true })
    expect(annotations.dimensions.map(({ key }) => key)).toEqual(['width'])
    expect(annotations.arrow).toBeNull()
    const first = annotations.notes.map(({ lines }) => lines[0].strong).sort()
    expect(first).toEqual(['24 × 32', 'C, 1 no.', 'K1–K4, 4 no.'])
  })

  it('holds leaders and names at their places while a spiral moves', () => {
    const section = createLayoutSection('five-spirals')
    const start = annotate(section, { selection: { kind: 'spiral', id: 'K1' } })
    const { notes, tag } = start.annotations
    const callouts = new Map([...notes, ...(tag ? [tag] : [])].map((note) => [note.key, note]))
    const [C, K1, ...rest] = section.spirals
    const moved = { ...section, spirals: [C, { ...K1, centre: [300, 200] as [number, number] }, ...rest] }
    const next = createAnnotations({
      section: moved,
      frame: start.frame,
      angle: 0,
      arrowSide: -1,
      offsets: start.offsets,
      selection: { kind: 'spiral', id: 'K1' },
      neutralAxis: null,
      hint: [],
      held: callouts,
    })
    expect(next.tag?.box).toEqual(tag?.box)
    expect(next.tag?.leader).not.toBe(tag?.leader)
    expect(next.labels.map(({ id, x, y }) => [id, x, y])).toEqual(
      start.annotations.labels.map(({ id, x, y }) => [id, x, y]),
    )
  })
})
