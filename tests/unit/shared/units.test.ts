import { expect, it } from 'vitest'
import { fromShown, toShown, unitOf } from '#shared/units.ts'

it.each([
  ['force', 6_000_000, 6000, 'kN'],
  ['moment', 880_400_000, 880.4, 'kN·m'],
  ['curvature', 6.486669e-5, 0.06486669, '1/m'],
  ['massPerLength', 0.01578, 15.78, 'kg/m'],
  ['length', 1084, 1084, 'mm'],
  ['stress', 40, 40, 'MPa'],
  ['strain', 0.002, 0.002, ''],
] as const)('%s: %s is shown as %s %s', (kind, stored, shown, unit) => {
  expect(toShown(kind, stored)).toBeCloseTo(shown, 9)
  expect(fromShown(kind, shown) / stored).toBeCloseTo(1, 12)
  expect(unitOf(kind)).toBe(unit)
})
