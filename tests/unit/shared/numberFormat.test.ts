import { describe, expect, it } from 'vitest'
import {
  formatGiven,
  formatInput,
  formatNumber,
  formatQuantity,
  formatWithUnit,
  noNumber,
} from '#shared/numberFormat.ts'

/** The narrow space between thousands and before units, as a plain one. */
const plain = (text: string) => text.replaceAll('\u202F', ' ')

describe('formatNumber', () => {
  it.each([
    [0, 4, '0'],
    [0.0053604, 4, '0.005360'],
    [13.12993, 3, '13.1'],
    [9999.6, 4, '10 000'],
    [17713.159, 4, '17 713'],
    [2242800, 4, '2 242 800'],
    [-0.015, 3, '−0.0150'],
    [1234.5, 5, '1234.5'],
    [2.5e-14, 2, '2.5 × 10⁻¹⁴'],
    [1e-6, 1, '1 × 10⁻⁶'],
  ])('writes %d in %d figures as %s', (value, digits, wanted) => {
    expect(plain(formatNumber(value, digits))).toBe(wanted)
  })

  it('shows a dash where there is no number', () => {
    for (const none of [null, undefined, Number.NaN, Infinity]) expect(formatNumber(none)).toBe(noNumber)
  })
})

describe('formatGiven', () => {
  it.each([
    [80, '80'],
    [201.061930000001, '201.062'],
    [0.002, '0.002'],
    [12000, '12 000'],
    [1500.5, '1500.5'],
    [-485, '−485'],
    [0, '0'],
  ])('writes %d as it was given: %s', (value, wanted) => {
    expect(plain(formatGiven(value))).toBe(wanted)
  })
})

describe('units', () => {
  it('converts to the unit shown and names it', () => {
    expect(plain(formatWithUnit('moment', 17713159093, 5))).toBe('17 713 kN·m')
    expect(plain(formatWithUnit('curvature', 4.2434e-5))).toBe('0.04243 1/m')
    expect(plain(formatInput('force', 12_000_000))).toBe('12 000 kN')
    expect(formatWithUnit('angle', 45, 2)).toBe('45°')
    expect(formatWithUnit('strain', 0.004, 2)).toBe('0.0040')
    expect(formatQuantity('massPerLength', 0.0858, 3)).toBe('85.8')
    expect(formatWithUnit('force', null)).toBe(noNumber)
  })
})
