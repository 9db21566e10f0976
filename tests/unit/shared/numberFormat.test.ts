import { describe, expect, it } from 'vitest'
import {
  formatGiven,
  formatInput,
  formatNumber,
  formatQuantity,
  formatWithUnit,
  noNumber,
} from '#shared/numberFormat.ts'

const narrow = '\u202F'

describe('numbers as written', () => {
  it.each([
    [0, '0'],
    [-0, '0'],
    [1, '1.000'],
    [9999.6, `10${narrow}000`],
    [1234.5, '1235'],
    [12345.6, `12${narrow}346`],
    [-1234567, `\u22121${narrow}234${narrow}567`],
    [0.0000648667, '0.00006487'],
    [1.5e-9, `1.500${narrow}×${narrow}10⁻⁹`],
    [-2e15, `\u22122.000${narrow}×${narrow}10¹⁵`],
  ])('%s is %s', (value, text) => {
    expect(formatNumber(value)).toBe(text)
  })

  it('what is no number is a dash', () => {
    for (const value of [null, undefined, Number.NaN, Infinity]) expect(formatNumber(value)).toBe(noNumber)
    expect(formatQuantity('force', null)).toBe(noNumber)
    expect(formatWithUnit('force', undefined)).toBe(noNumber)
  })

  it('a quantity is written in its unit, with as many figures as asked', () => {
    expect(formatQuantity('moment', 880_400_000)).toBe('880.4')
    expect(formatWithUnit('moment', 880_400_000, 3)).toBe(`880${narrow}kN·m`)
    expect(formatWithUnit('angle', 45, 2)).toBe('45°')
    expect(formatWithUnit('ratio', 15.95)).toBe('15.95')
  })
})

describe('inputs as they were given', () => {
  it.each([
    [0, '0'],
    [1084, '1084'],
    [0.005, '0.005'],
    [22.5, '22.5'],
    [201.06193, '201.062'],
    [31622.7766, `31${narrow}622.8`],
    [-90, '\u221290'],
    [12_000_000, `12${narrow}000${narrow}000`],
    [null, noNumber],
  ])('%s is %s', (value, text) => {
    expect(formatGiven(value)).toBe(text)
  })

  it('with their unit', () => {
    expect(formatInput('force', 5_400_000)).toBe(`5400${narrow}kN`)
    expect(formatInput('length', 12.5)).toBe(`12.5${narrow}mm`)
    expect(formatInput('length', undefined)).toBe(noNumber)
  })
})
