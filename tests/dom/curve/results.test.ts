import { describe, expect, it, vi } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import { analyse } from '#workers/solver/analyse.ts'
import KeyFigures from '@/components/curve/KeyFigures.vue'
import LimitStateStrip from '@/components/curve/LimitStateStrip.vue'
import ResultWarnings from '@/components/curve/ResultWarnings.vue'
import PitchTable from '@/components/study/PitchTable.vue'
import { toPitchRow } from '@/plotting/pitchRows.ts'
import { listShownStates } from '@/plotting/shownStates.ts'
import { mountPart } from '../../helpers/mountPart.ts'

const reply = analyse(layouts.find((layout) => layout.id === 'five-spirals')!.create())
if (reply.status !== 'solved') throw new Error('the layout is sound')
const { result } = reply

describe('results beside a curve', () => {
  it('lists the states in the order in which they occur, each with a number', () => {
    const pick = vi.fn()
    const wrapper = mountPart(LimitStateStrip, { result, onPick: pick })
    const states = listShownStates(result)
    const curvatures = states.map((state) => state.curvature)
    expect([...curvatures].sort((a, b) => a - b)).toEqual(curvatures)
    expect(wrapper.findAll('button')).toHaveLength(states.length)
    expect(wrapper.text()).toContain('spiral C fractures')
    void wrapper.findAll('button')[1].trigger('click')
    expect(pick).toHaveBeenCalledExactlyOnceWith(1)
  })

  it('says when its numbers belong to the input before', () => {
    const wrapper = mountPart(LimitStateStrip, { result, stale: true })
    expect(wrapper.text()).toContain('input before, computing')
  })

  it('names what governs, and shows a dash where there is no number', () => {
    const broken = {
      ...result,
      idealised: { ...result.idealised, ductility: null, yieldCurvature: null },
      stop: { reason: 'curvature-limit' as const },
    }
    const wrapper = mountPart(KeyFigures, { result: broken })
    expect(wrapper.text()).toContain('none reached')
    expect(wrapper.text()).toContain('There is no idealised curve')
    expect(wrapper.findAll('dd')[2].text()).toBe('–')
  })

  it('tells every caution with its source, equal ones once', () => {
    const warning = { code: 'x', path: 'p', message: 'Mind the pitch.', source: 'common practice' }
    const wrapper = mountPart(ResultWarnings, { warnings: [warning, { ...warning, path: 'q' }] })
    expect(wrapper.findAll('li')).toHaveLength(1)
    expect(wrapper.text()).toContain('common practice')
  })

  it('marks the pitch in force and explains one without a curve', () => {
    const rows = [
      toPitchRow(80, true, result, null),
      toPitchRow(12, false, null, 'must be larger than the bar'),
    ]
    const wrapper = mountPart(PitchTable, { rows, stale: false })
    expect(wrapper.get('tr.force').text()).toContain('in force')
    expect(wrapper.get('.problem').text()).toBe('must be larger than the bar')
  })
})
