import { describe, expect, it, vi } from 'vitest'
import QuantityField from '@/components/base/QuantityField.vue'
import { mountPart } from '../../helpers/mountPart.ts'

function setup(props: Record<string, unknown> = {}) {
  const update = vi.fn()
  const wrapper = mountPart(QuantityField, {
    modelValue: 12_000_000,
    kind: 'force',
    label: 'Axial load',
    'onUpdate:modelValue': update,
    ...props,
  })
  const input = wrapper.get('input')
  const type = async (text: string) => {
    await input.setValue(text)
    await input.trigger('blur')
  }
  return { wrapper, input, type, update }
}

describe('QuantityField', () => {
  it('shows the stored value in the shown unit, and stores what is typed in it', async () => {
    const { wrapper, input, type, update } = setup()
    expect(input.element.value).toBe('12000')
    expect(wrapper.text()).toContain('kN')
    await type('15000.5')
    expect(update).toHaveBeenCalledExactlyOnceWith(15_000_500)
  })

  it('changes nothing when it is left as it was', async () => {
    const { input, update } = setup({ modelValue: 33541.0196, kind: 'stress' })
    await input.trigger('focus')
    await input.trigger('blur')
    expect(update).not.toHaveBeenCalled()
  })

  it('understands a decimal comma, thousands apart by spaces, and a minus sign', async () => {
    const { type, update } = setup()
    await type('−1 250,5')
    expect(update).toHaveBeenCalledWith(-1_250_500)
  })

  it('explains what is no number in place and keeps it', async () => {
    const { wrapper, input, type, update } = setup()
    await type('12 tons')
    expect(wrapper.get('[role=alert]').text()).toBe('found "12 tons", allowed a number in kN')
    expect(input.element.value).toBe('12 tons')
    expect(input.attributes('aria-invalid')).toBe('true')
    expect(update).not.toHaveBeenCalled()
  })

  it.each(['12,000', '-1,250', '12 ,000'])('does not guess what "%s" means', async (typed) => {
    const { wrapper, input, type, update } = setup()
    await type(typed)
    expect(wrapper.get('[role=alert]').text()).toContain(`found "${typed}", allowed`)
    expect(input.element.value).toBe(typed)
    await input.trigger('keydown', { key: 'ArrowUp' })
    expect(update).not.toHaveBeenCalled()
  })

  it.each([
    ['0,125', 125],
    ['12,5', 12_500],
    ['1.5e3', 1_500_000],
  ])('reads %s kN', async (typed, stored) => {
    const { type, update } = setup()
    await type(typed)
    expect(update).toHaveBeenCalledExactlyOnceWith(stored)
  })

  it.each(['0x10', 'Infinity', '1e', '1,250,000', '.', '--5'])('takes "%s" for no number', async (typed) => {
    const { wrapper, type, update } = setup()
    await type(typed)
    expect(wrapper.get('[role=alert]').text()).toBe(`found "${typed}", allowed a number in kN`)
    expect(update).not.toHaveBeenCalled()
  })

  it('says which bounds were passed, in the shown unit', async () => {
    const { wrapper, type, update } = setup({ modelValue: 80, kind: 'length', min: 1, max: 200 })
    await type('250')
    expect(wrapper.get('[role=alert]').text().replaceAll('\u202F', ' ')).toBe(
      'found 250 mm, allowed at most 200 mm',
    )
    await type('0')
    expect(wrapper.get('[role=alert]').text().replaceAll('\u202F', ' ')).toBe(
      'found 0 mm, allowed at least 1 mm',
    )
    expect(update).not.toHaveBeenCalled()
  })

  it('moves by its step on arrow keys, ten steps with Shift', async () => {
    const { input, update } = setup({ modelValue: 80, kind: 'length', step: 5 })
    await input.trigger('keydown', { key: 'ArrowUp' })
    expect(update).toHaveBeenLastCalledWith(85)
    await input.trigger('keydown', { key: 'ArrowDown', shiftKey: true })
    expect(update).toHaveBeenLastCalledWith(35)
  })

  it('goes back to the value in force on Escape', async () => {
    const { input, update } = setup()
    await input.setValue('nonsense')
    await input.trigger('keydown', { key: 'Escape' })
    expect(input.element.value).toBe('12000')
    expect(update).not.toHaveBeenCalled()
  })

  it('takes an emptied optional field as nothing given', async () => {
    const { type, update } = setup({ optional: true, modelValue: 35, kind: 'stress' })
    await type('')
    expect(update).toHaveBeenCalledExactlyOnceWith(null)
  })

  it('shows an issue of the document at its field', () => {
    const { wrapper } = setup({ error: 'must be larger than the bar of the spiral' })
    expect(wrapper.get('[role=alert]').text()).toContain('larger than the bar')
  })

  it('is no entry where the value may only be read', () => {
    const wrapper = mountPart(QuantityField, {
      modelValue: 80,
      kind: 'length',
      label: 'Pitch',
      readonly: true,
    })
    expect(wrapper.find('input').exists()).toBe(false)
    expect(wrapper.text().replaceAll('\u202F', ' ')).toContain('80 mm')
  })
})
