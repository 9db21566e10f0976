import { describe, expect, it } from 'vitest'
import { parsePitches } from '@/composables/usePitchComparison.ts'

describe('parsePitches', () => {
  it('reads pitches however they are parted, in ascending order and each once', () => {
    expect(parsePitches('100, 60;80  60')).toEqual({ pitches: [60, 80, 100] })
  })

  it.each([
    ['', 'Enter pitches in mm, for example 60, 80, 100'],
    ['60, x', 'Found "x", allowed numbers above 0, in mm'],
    ['60, -80', 'Found "-80", allowed numbers above 0, in mm'],
    ['1 2 3 4 5 6 7 8 9 10 11 12 13', 'Found 13 pitches, allowed up to 12'],
  ])('refuses %j with what is allowed', (text, problem) => {
    expect(parsePitches(text)).toEqual({ problem })
  })
})
