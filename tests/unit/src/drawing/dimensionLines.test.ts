import { describe, expect, it } from 'vitest'
import {
  createHead,
  createLevelDimension,
  createUprightDimension,
  keepNumbersClear,
} from '@/drawing/dimensionLines.ts'
import { formatSize } from '@/drawing/size.ts'
import { doBoxesMeet } from '@/drawing/textBox.ts'

describe('createLevelDimension', () => {
  it('stands between the points with heads inside and the number above its middle', () => {
    const line = createLevelDimension('a', 100, 300, 50, '1500', { from: 30 })
    expect(line.line).toBe('M100 50H300')
    expect(line.heads).toContain('M100 50L108 ')
    expect(line.heads).toContain('M300 50L292 ')
    expect([line.textX, line.textY, line.anchor]).toEqual([200, 46, 'middle'])
  })

  it('runs extension lines from a gap off the object to a little over the line, on either side', () => {
    expect(createLevelDimension('a', 100, 300, 50, '1', { from: 30 }).extensions).toBe('M100 34V54M300 34V54')
    expect(createLevelDimension('a', 100, 300, 10, '1', { from: 30 }).extensions).toBe('M100 26V6M300 26V6')
    expect(createLevelDimension('a', 100, 300, 10, '1').extensions).toBe('')
  })

  it('turns the heads inward from outside under 24 px, with the number beside', () => {
    const line = createLevelDimension('a', 100, 120, 50, '50')
    expect(line.line).toBe('M84 50H100M120 50H136')
    expect(line.heads).toContain('M100 50L92 ')
    expect(line.textX).toBeGreaterThan(136)
    expect(line.anchor).toBe('start')
    expect(createLevelDimension('a', 100, 124, 50, '50').line).toBe('M100 50H124')
  })

  it('puts a number that is longer than its line beside it', () => {
    const line = createLevelDimension('a', 100, 128, 50, '12345')
    expect(line.line).toBe('M100 50H128')
    expect(line.textX).toBeGreaterThan(128)
  })
})

describe('createUprightDimension', () => {
  it('is read from the right: the number stands left of the line, turned', () => {
    const line = createUprightDimension('a', 100, 300, 40, '1200', { from: 80 })
    expect(line.upright).toBe(true)
    expect([line.textX, line.textY]).toEqual([36, 200])
    expect(line.extensions).toBe('M76 100H36M76 300H36')
    // Turned by a quarter, the width of the number is its height.
    expect(line.box.bottom - line.box.top).toBeCloseTo(4 * 0.6 * 12, 9)
  })

  it('turns its heads inward when it is short', () => {
    expect(createUprightDimension('a', 100, 110, 40, '30').line).toBe('M40 84V100M40 110V126')
  })
})

describe('createHead', () => {
  it('is a closed triangle 8 long and 4.6 wide with its tip at the point', () => {
    expect(createHead(10, 20, 1, 0)).toBe('M10 20L2 22.3L2 17.7Z')
    expect(createHead(10, 20, 0, -1)).toBe('M10 20L12.3 28L7.7 28Z')
  })
})

describe('keepNumbersClear', () => {
  it('keeps all numbers of a chain apart, also where its links are short', () => {
    const places = [100, 122, 150, 172, 260]
    const chain = places
      .slice(1)
      .map((place, i) => createLevelDimension(`${i}`, places[i], place, 50, '12345', { from: 30 }))
    const placed = keepNumbersClear(chain)
    for (const [i, a] of placed.entries()) {
      for (const b of placed.slice(i + 1)) expect(doBoxesMeet(a.box, b.box)).toBe(false)
    }
  })

  it('moves off what is taken and leaves alone what is clear', () => {
    const line = createLevelDimension('a', 100, 300, 50, '1500')
    expect(keepNumbersClear([line])[0]).toBe(line)
    const [moved] = keepNumbersClear([line], [{ left: 190, right: 210, top: 36, bottom: 48 }])
    expect(moved.textY).toBeGreaterThan(50)
    expect(moved.line).toBe(line.line)
  })
})

describe('formatSize', () => {
  it('writes sizes as draughtsmen do: no separators, a decimal only where there is one', () => {
    expect(formatSize(1500)).toBe('1500')
    expect(formatSize(12500)).toBe('12500')
    expect(formatSize(92.55)).toBe('92.6')
    expect(formatSize(-485)).toBe('−485')
    expect(formatSize(-0.01)).toBe('0')
  })
})
