import { enableAutoUnmount, flushPromises, mount } from '@vue/test-utils'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h, nextTick, shallowRef } from 'vue'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { Section } from '#shared/document/analysisDocument.ts'
import SectionDrawing from '@/components/section/SectionDrawing.vue'
import type { Selection } from '@/drawing/selection.ts'
import { createFrame, createHollowOctagon } from '../../helpers/drawnSections.ts'
import { readSound, solve } from '../../helpers/solve.ts'

type Edit = [section: Section, commit: 'later' | 'now']

/** The drawing under a page that takes every edit over, as the section page does. */
function setup(layout = 'five-spirals', props: Record<string, unknown> = {}) {
  const document = readSound(layouts.find((one) => one.id === layout)!.create())
  const { spirals, zones } = solve(document)
  const section = shallowRef(document.section)
  const selection = shallowRef<Selection | null>(null)
  const edits: Edit[] = []
  const page = defineComponent({
    setup: () => () =>
      h(SectionDrawing, {
        section: section.value,
        angle: 0,
        spirals,
        zones,
        editable: true,
        selection: selection.value,
        'onUpdate:selection': (now: Selection | null) => (selection.value = now),
        onEdit: (now: Section, commit: 'later' | 'now') => {
          edits.push([now, commit])
          section.value = now
        },
        ...props,
      }),
  })
  const wrapper = mount(page, { attachTo: globalThis.document.body })
  const svg = wrapper.get('svg.sheet')
  // The element of a test has no layout: it is as wide as the drawing takes it to be at first.
  const { view } = createFrame(document.section.outline, 760)
  const before = document.section

  async function point(type: string, mm: [number, number], keys: PointerEventInit = {}) {
    svg.element.dispatchEvent(
      new PointerEvent(type, {
        bubbles: true,
        cancelable: true,
        pointerId: 1,
        pointerType: 'mouse',
        button: 0,
        clientX: view.x(mm[0]),
        clientY: view.y(mm[1]),
        ...keys,
      }),
    )
    await nextTick()
  }
  /** Every step waits for the frame in which it is sent. */
  async function dragThrough(places: [number, number][], keys: PointerEventInit = {}) {
    await point('pointerdown', places[0], keys)
    for (const place of places.slice(1)) {
      await point('pointermove', place, keys)
      await frame()
    }
  }
  return { before, section, selection, edits, wrapper, svg, point, dragThrough }
}

async function frame() {
  await new Promise((resolve) => requestAnimationFrame(resolve))
  await flushPromises()
}

function listCentres(section: Section) {
  return section.spirals.map((spiral) => spiral.centre)
}

enableAutoUnmount(afterEach)
afterEach(() => {
  vi.useRealTimers()
})

describe('what is drawn', () => {
  it.each(layouts.map((layout) => layout.id))(
    'shows every spiral, bar and size of the layout %s',
    (layout) => {
      const { before, wrapper, svg } = setup(layout)
      const bars = before.bars.reduce(
        (sum, { layout: place }) => sum + (place.kind === 'ring' ? place.count : 0),
        0,
      )
      expect(wrapper.findAll('circle.bar').length).toBe(bars)
      expect(wrapper.findAll('.static circle.wire')).toHaveLength(before.spirals.length)
      expect(svg.attributes('aria-label')).toContain('longitudinal bars')
      expect(wrapper.findAll('.hatch path').length).toBeGreaterThan(before.spirals.length)
      expect(svg.html()).not.toMatch(/NaN|undefined|Infinity/)
    },
  )

  it('explains the hatching, with both families where spirals overlap', () => {
    const key = setup().wrapper.get('.key')
    expect(key.text()).toContain('cover')
    expect(key.text()).toContain('K1–K4')
    expect(key.text()).toContain('overlap')
    expect(key.findAll('g.hatch').map((sample) => sample.findAll('path').length)).toEqual([0, 1, 1, 2])
  })

  it('has no hatching and no key to it while nothing is known', () => {
    const { wrapper } = setup('five-spirals', { spirals: null, zones: null })
    expect(wrapper.findAll('.hatch path')).toHaveLength(0)
    expect(wrapper.text()).not.toContain('Hatching')
  })

  it('shows a picked state: neutral axis, strains, bars solid or open', () => {
    const { wrapper } = setup('five-spirals', {
      state: { curvature: 0.005 / 375, axialStrain: -0.005, label: 'state 4' },
      yieldStrains: { L: 0.0023 },
    })
    expect(wrapper.text()).toContain('N.A.')
    expect(wrapper.text()).toContain('+0.00500')
    expect(wrapper.text()).toContain('Bars, state 4')
    const open = wrapper.findAll('.static .bar.open').length
    expect(open).toBeGreaterThan(0)
    expect(open).toBeLessThan(56)
  })

  it('draws a hollow polygon with its void', () => {
    const { wrapper, svg } = setup('one-spiral', { section: createHollowOctagon(), state: null })
    expect(wrapper.text()).toContain('void Ø500')
    expect(svg.html()).not.toMatch(/NaN|undefined/)
  })

  it('marks parts with an issue', () => {
    const { wrapper } = setup('five-spirals', {
      issuePaths: ['section.spirals[1].diameter', 'section.bars[0]'],
    })
    expect(wrapper.findAll('.wire.faulty')).toHaveLength(1)
    expect(wrapper.findAll('.bar.faulty')).toHaveLength(24)
  })

  it('offers nothing to hold where it may only be read', async () => {
    const { wrapper, svg, edits, dragThrough } = setup('five-spirals', { editable: false })
    expect(wrapper.find('.handles').exists()).toBe(false)
    expect([svg.attributes('tabindex'), svg.attributes('role')]).toEqual([undefined, 'img'])
    await dragThrough([
      [485, 485],
      [400, 400],
    ])
    await svg.trigger('keydown', { key: 'Tab' })
    expect(edits).toEqual([])
  })

  it('keeps to the outer dimension and leaders when it is compact', () => {
    const { wrapper } = setup('five-spirals', { compact: true, editable: false })
    expect(wrapper.findAll('.dimension')).toHaveLength(1)
    expect(wrapper.text()).toContain('K1–K4, 4 no.')
    expect(wrapper.find('.key').exists()).toBe(false)
  })
})

describe('dragging', () => {
  it('sends every step for later and the end once for now, with mirror images and rings of bars', async () => {
    const { edits, point, dragThrough, selection } = setup()
    await dragThrough([
      [485, 485],
      [450, 460],
      [332, 412],
      [332, 405],
    ])
    expect(selection.value).toEqual({ kind: 'spiral', id: 'K1' })
    await point('pointerup', [332, 405])
    expect(edits.map(([, commit]) => commit)).toEqual(['later', 'later', 'later', 'now'])
    const [last] = edits.at(-1)!
    expect(listCentres(last)).toEqual([
      [0, 0],
      [330, 405],
      [-330, 405],
      [-330, -405],
      [330, -405],
    ])
    expect(last.bars[3].layout).toMatchObject({ centre: [-330, -405] })
  })

  it('sends one step a frame, however many moves there are', async () => {
    const { edits, point } = setup()
    await point('pointerdown', [485, 485])
    for (let i = 1; i <= 10; i++) await point('pointermove', [485 - 10 * i, 485])
    await frame()
    expect(edits).toHaveLength(1)
    await point('pointerup', [385, 485])
    expect(edits.map(([, commit]) => commit)).toEqual(['later', 'now'])
  })

  it('goes back on Escape and sends nothing after it', async () => {
    const { before, edits, point, dragThrough, svg, selection } = setup()
    await dragThrough([
      [485, 485],
      [400, 300],
    ])
    await svg.trigger('keydown', { key: 'Escape' })
    expect(edits.at(-1)).toEqual([before, 'later'])
    const count = edits.length
    await point('pointermove', [200, 200])
    await frame()
    await point('pointerup', [200, 200])
    expect(edits).toHaveLength(count)
    // Escape was the drag's: the spiral stays selected.
    expect(selection.value).toEqual({ kind: 'spiral', id: 'K1' })
  })

  it('goes back when the pointer is taken away', async () => {
    const { before, edits, point, dragThrough } = setup()
    await dragThrough([
      [485, 485],
      [400, 300],
    ])
    await point('pointercancel', [400, 300])
    expect(edits.at(-1)).toEqual([before, 'later'])
  })

  it('moves one alone with Alt and says so', async () => {
    const { wrapper, edits, point, dragThrough } = setup()
    await dragThrough(
      [
        [485, 485],
        [330, 150],
      ],
      { altKey: true },
    )
    expect(wrapper.get('.hint').text()).toContain('K1 alone')
    await point('pointerup', [330, 150], { altKey: true })
    expect(listCentres(edits.at(-1)![0])).toEqual([
      [0, 0],
      [330, 150],
      [-485, 485],
      [-485, -485],
      [485, -485],
    ])
  })

  it('says why a spiral rests where it does', async () => {
    const { wrapper, dragThrough } = setup()
    await dragThrough([
      [485, 485],
      [301, 306],
    ])
    expect(wrapper.get('.hint').text()).toContain('on the 45° line')
    expect(wrapper.get('.hint').text()).toContain('K1–K4 kept alike')
    const chosen = wrapper.findAll('.dimension.selected text').map((text) => text.text())
    expect(chosen).toEqual(['305', '305'])
  })

  it('selects by a click without editing, and lets go on empty paper', async () => {
    const { edits, point, selection } = setup()
    await point('pointerdown', [485, 485])
    await point('pointermove', [486, 485])
    await point('pointerup', [486, 485])
    expect(selection.value).toEqual({ kind: 'spiral', id: 'K1' })
    await point('pointerdown', [-900, 900])
    expect(selection.value).toBeNull()
    expect(edits).toEqual([])
  })

  it('resizes by a handle and keeps the bars at the wire', async () => {
    const { edits, point, dragThrough, selection } = setup()
    selection.value = { kind: 'spiral', id: 'K1' }
    await nextTick()
    await dragThrough([
      [715, 485],
      [684, 485],
    ])
    await point('pointerup', [684, 485])
    const [last] = edits.at(-1)!
    expect(last.spirals.map(({ diameter }) => diameter)).toEqual([1380, 340, 340, 340, 340])
    expect(last.bars[1].layout).toMatchObject({ diameter: 299 })
  })

  it('resizes a ring of bars, and turns it with Shift', async () => {
    // A bar of the centre ring stands at 97.5 degrees.
    const at = (r: number, degrees: number): [number, number] => [
      r * Math.cos((degrees * Math.PI) / 180),
      r * Math.sin((degrees * Math.PI) / 180),
    ]
    const sized = setup()
    await sized.dragThrough([at(664, 97.5), at(640, 97.5)])
    await sized.point('pointerup', at(640, 97.5))
    expect(sized.selection.value).toEqual({ kind: 'bars', group: 0 })
    expect(sized.edits.at(-1)![0].bars[0].layout).toMatchObject({ diameter: 1280, startAngle: 97.5 })
    const turned = setup()
    await turned.dragThrough([at(664, 97.5), at(664, 108)], { shiftKey: true })
    await turned.point('pointerup', at(664, 108), { shiftKey: true })
    expect(turned.edits.at(-1)![0].bars[0].layout).toMatchObject({ diameter: 1328, startAngle: 108 })
  })

  it('breaks the likeness by a click on its word', async () => {
    const { wrapper, svg, selection, edits } = setup()
    selection.value = { kind: 'spiral', id: 'K1' }
    await nextTick()
    await wrapper.get('[data-test=alike]').trigger('pointerdown')
    expect(wrapper.get('.hint').text()).toContain('K1 alone')
    await svg.trigger('keydown', { key: 'ArrowUp' })
    expect(listCentres(edits[0][0])[2]).toEqual([-485, 485])
    selection.value = { kind: 'spiral', id: 'K3' }
    await nextTick()
    expect(wrapper.get('.hint').text()).toContain('kept alike')
  })
})

describe('keyboard', () => {
  it('goes from part to part with Tab, then leaves', async () => {
    const { svg, selection } = setup('one-spiral')
    const press = async (shiftKey = false) => {
      const event = new KeyboardEvent('keydown', { key: 'Tab', shiftKey, bubbles: true, cancelable: true })
      svg.element.dispatchEvent(event)
      await nextTick()
      return event.defaultPrevented
    }
    expect(await press()).toBe(true)
    expect(selection.value).toEqual({ kind: 'spiral', id: 'S1' })
    expect(await press()).toBe(true)
    expect(selection.value).toEqual({ kind: 'bars', group: 0 })
    expect(await press(true)).toBe(true)
    expect(selection.value).toEqual({ kind: 'spiral', id: 'S1' })
    await press()
    expect(await press()).toBe(false)
    expect(selection.value).toBeNull()
  })

  it('moves and resizes for now, and lets go on Escape', async () => {
    const { svg, edits, selection } = setup()
    selection.value = { kind: 'spiral', id: 'K1' }
    await nextTick()
    await svg.trigger('keydown', { key: 'ArrowLeft' })
    await svg.trigger('keydown', { key: 'ArrowLeft', altKey: true })
    await svg.trigger('keydown', { key: '-' })
    expect(edits.map(([, commit]) => commit)).toEqual(['now', 'now', 'now'])
    const [last] = edits.at(-1)!
    expect(last.spirals[2]).toMatchObject({ centre: [-479, 485], diameter: 395 })
    await svg.trigger('keydown', { key: 'Escape' })
    expect(selection.value).toBeNull()
    await svg.trigger('keydown', { key: 'ArrowLeft' })
    expect(edits).toHaveLength(3)
  })

  it('leaves keys of the page alone', async () => {
    const { svg, edits, selection } = setup()
    selection.value = { kind: 'spiral', id: 'K1' }
    await nextTick()
    await svg.trigger('keydown', { key: '-', ctrlKey: true })
    expect(edits).toEqual([])
  })

  it('tells the change once after it has settled', async () => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] })
    const { svg, wrapper, selection } = setup()
    const live = () => wrapper.get('[aria-live]').text()
    selection.value = { kind: 'spiral', id: 'K1' }
    await nextTick()
    await svg.trigger('keydown', { key: 'ArrowLeft' })
    await svg.trigger('keydown', { key: 'ArrowLeft' })
    expect(live()).toBe('')
    await vi.advanceTimersByTimeAsync(600)
    expect(live()).toBe('Spiral K1, diameter 400, bar 12, pitch 80, centre 475, 485, K1–K4 kept alike.')
  })
})
