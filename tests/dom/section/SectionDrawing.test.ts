import { describe, expect, it, vi } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { Section } from '#shared/document/analysisDocument.ts'
import SectionDrawing from '@/components/section/SectionDrawing.vue'
import { mountPart } from '../../helpers/mountPart.ts'
import { readSound, solve } from '../../helpers/solve.ts'

function setup(layout = 'five-spirals') {
  const document = readSound(layouts.find((one) => one.id === layout)!.create())
  const { spirals, zones } = solve(document)
  const edit = vi.fn<(section: Section, commit: 'now' | 'later') => void>()
  const wrapper = mountPart(SectionDrawing, {
    section: document.section,
    angle: 0,
    spirals,
    zones,
    editable: true,
    onEdit: edit,
  })
  return { document, edit, wrapper, svg: wrapper.get('svg.sheet') }
}

describe('SectionDrawing', () => {
  it.each(layouts.map((layout) => layout.id))(
    'draws the layout %s with every spiral, bar and size',
    (layout) => {
      const { document, wrapper, svg } = setup(layout)
      expect(wrapper.findAll('circle.bar')).toHaveLength(
        document.section.bars.reduce(
          (sum, { layout: place }) => sum + (place.kind === 'ring' ? place.count : 0),
          0,
        ),
      )
      expect(wrapper.findAll('.static circle.wire')).toHaveLength(document.section.spirals.length)
      expect(svg.attributes('aria-label')).toContain('longitudinal bars')
      expect(svg.html()).not.toContain('NaN')
    },
  )

  it('hatches zones with both families where spirals overlap', () => {
    const { wrapper } = setup()
    const key = wrapper.get('.key').text()
    expect(key).toContain('cover')
    expect(key).toContain('overlap')
    expect(key).toContain('K1–K4')
  })

  it('moves the selected spiral and its mirror images by the keyboard', async () => {
    const { edit, svg } = setup()
    await svg.trigger('keydown', { key: 'Tab' })
    await svg.trigger('keydown', { key: 'Tab' })
    await svg.trigger('keydown', { key: 'ArrowLeft' })
    const [section, commit] = edit.mock.calls[0]
    expect(commit).toBe('now')
    expect(section.spirals.map((spiral) => spiral.centre)).toEqual([
      [0, 0],
      [480, 485],
      [-480, 485],
      [-480, -485],
      [480, -485],
    ])
    // The rings of bars inside went along.
    expect(section.bars[1].layout).toMatchObject({ centre: [480, 485] })
  })

  it('resizes by plus and minus and lets go on Escape', async () => {
    const { edit, svg, wrapper } = setup('one-spiral')
    await svg.trigger('keydown', { key: 'Tab' })
    await svg.trigger('keydown', { key: '-' })
    expect(edit.mock.calls[0][0].spirals[0].diameter).toBe(1079)
    expect(edit.mock.calls[0][0].bars[0].layout).toMatchObject({ diameter: 1031 })
    expect(wrapper.find('.wire.selected').exists()).toBe(true)
    await svg.trigger('keydown', { key: 'Escape' })
    expect(wrapper.find('.wire.selected').exists()).toBe(false)
  })

  it('offers nothing to hold where it may only be read', () => {
    const { document } = setup()
    const wrapper = mountPart(SectionDrawing, {
      section: document.section,
      angle: 0,
      spirals: null,
      zones: null,
    })
    expect(wrapper.find('.handles').exists()).toBe(false)
    expect(wrapper.get('svg.sheet').attributes('tabindex')).toBeUndefined()
  })
})
