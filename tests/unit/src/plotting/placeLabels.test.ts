import { describe, expect, it } from 'vitest'
import { placeEndLabels, placeLabels } from '@/plotting/placeLabels.ts'

const frame = { left: 0, right: 600, top: 0, bottom: 400 }
const curve = Array.from({ length: 120 }, (_, i) => ({ x: 5 * i, y: 300 - 2 * Math.min(i, 100) }))

describe('placeLabels', () => {
  const requests = [40, 60, 62, 100, 250, 480].map((x) => ({
    ...curve[Math.round(x / 5)],
    width: 110,
    height: 15,
  }))
  const placed = placeLabels(requests, curve, frame)

  it('finds room for every label inside the frame', () => {
    expect(placed.every((label) => label !== null)).toBe(true)
    for (const label of placed) {
      expect(label!.left).toBeGreaterThanOrEqual(frame.left)
      expect(label!.left + 110).toBeLessThanOrEqual(frame.right)
      expect(label!.top).toBeGreaterThanOrEqual(frame.top)
      expect(label!.top + 15).toBeLessThanOrEqual(frame.bottom)
    }
  })

  it('lets no two labels overlap, and none lie on the curve', () => {
    const boxes = placed.map((label) => label!)
    boxes.forEach((a, i) => {
      for (const b of boxes.slice(i + 1)) {
        const apart =
          a.left + 110 <= b.left || b.left + 110 <= a.left || a.top + 15 <= b.top || b.top + 15 <= a.top
        expect(apart).toBe(true)
      }
      for (const { x, y } of curve) {
        expect(x > a.left && x < a.left + 110 && y > a.top && y < a.top + 15).toBe(false)
      }
    })
  })

  it('keeps labels where they are when the curve moves a little', () => {
    const moved = placeLabels(
      requests.map((request) => ({ ...request, y: request.y + 1 })),
      curve.map((point) => ({ ...point, y: point.y + 1 })),
      frame,
    )
    moved.forEach((label, i) => expect(Math.abs(label!.top - placed[i]!.top - 1)).toBeLessThan(1e-9))
  })

  it('leaves a label out rather than laying it over another', () => {
    const crowd = Array.from({ length: 60 }, () => ({ x: 50, y: 20, width: 90, height: 15 }))
    const some = placeLabels(crowd, [], { left: 0, right: 160, top: 0, bottom: 60 })
    expect(some.some((label) => label === null)).toBe(true)
  })
})

describe('placeEndLabels', () => {
  it('keeps labels apart, in order, and within the frame', () => {
    const heights = placeEndLabels([100, 98, 103, 395], 16, { top: 0, bottom: 400 })
    expect(heights[1]).toBeLessThan(heights[0])
    expect(heights[0]).toBeLessThan(heights[2])
    const sorted = [...heights].sort((a, b) => a - b)
    for (let i = 1; i < sorted.length; i++) expect(sorted[i] - sorted[i - 1]).toBeGreaterThanOrEqual(16)
    expect(sorted[3] + 8).toBeLessThanOrEqual(400)
  })

  it('leaves labels that have room where they belong', () => {
    expect(placeEndLabels([50, 200], 16, { top: 0, bottom: 400 })).toEqual([50, 200])
  })
})
