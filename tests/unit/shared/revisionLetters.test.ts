import { expect, it } from 'vitest'
import { toRevisionLetters } from '#shared/revisionLetters.ts'

it.each([
  [1, 'A'],
  [2, 'B'],
  [26, 'Z'],
  [27, 'AA'],
  [52, 'AZ'],
  [53, 'BA'],
  [702, 'ZZ'],
  [703, 'AAA'],
])('revision %s is %s', (index, letters) => {
  expect(toRevisionLetters(index)).toBe(letters)
})

it.each([0, -1, 1.5, Number.NaN])('%s has no letters', (index) => {
  expect(() => toRevisionLetters(index)).toThrow(RangeError)
})
