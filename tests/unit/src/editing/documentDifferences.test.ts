import { describe, expect, it } from 'vitest'
import { listDifferences } from '@/editing/documentDifferences.ts'

describe('listDifferences', () => {
  it('finds nothing between equal documents', () => {
    expect(listDifferences({ a: [1, { b: 2 }] }, { a: [1, { b: 2 }] })).toEqual([])
  })

  it('names a changed value by its path with both sides', () => {
    const mine = { section: { spirals: [{ pitch: 80 }, { pitch: 70 }] } }
    const theirs = { section: { spirals: [{ pitch: 80 }, { pitch: 60 }] } }
    expect(listDifferences(mine, theirs)).toEqual([
      { path: 'section.spirals[1].pitch', mine: '70', theirs: '60' },
    ])
  })

  it('says which side lacks a part', () => {
    expect(listDifferences({ bars: [{ count: 8 }] }, { bars: [] })).toEqual([
      { path: 'bars[0]', mine: '{"count":8}', theirs: 'absent' },
    ])
  })

  it('does not walk into parts of different make', () => {
    expect(listDifferences({ outline: [1] }, { outline: { kind: 'circle' } })).toHaveLength(1)
  })
})
