import { describe, expect, it } from 'vitest'
import type { Outline } from '#shared/document/analysisDocument.ts'
import { createBendingAxes } from '#workers/solver/geometry/axes.ts'
import { computeHalfChord, createOutlineChords, findCrossings } from '#workers/solver/geometry/chords.ts'

function cut(outline: Outline, angle: number, v: number): number[] {
  const chords = createOutlineChords(outline, createBendingAxes(outline, angle))
  const out = new Float64Array(chords.most)
  return [...out.subarray(0, chords.cut(v, out))]
}

describe('chords of outlines', () => {
  it('of a circle', () => {
    expect(cut({ kind: 'circle', diameter: 1000 }, 30, 300)).toEqual([-400, 400])
    expect(cut({ kind: 'circle', diameter: 1000 }, 30, 501)).toEqual([])
  })

  it('of an oblong, along and across', () => {
    const oblong: Outline = { kind: 'oblong', width: 1800, depth: 1000 }
    expect(cut(oblong, 0, 0)).toEqual([-900, 900])
    expect(cut(oblong, 0, 300)).toEqual([-800, 800])
    expect(cut(oblong, 90, 0)).toEqual([-500, 500])
    // 700 from the middle lies 300 into the round end.
    expect(cut(oblong, 90, 700)).toEqual([-400, 400])
    expect(cut(oblong, 90, 901)).toEqual([])
  })

  it('of an oblong at 45 degrees, between its straight sides', () => {
    const [from, to] = cut({ kind: 'oblong', width: 3000, depth: 1000 }, 45, 0)
    expect(to - from).toBeCloseTo(1000 * Math.SQRT2, 9)
    expect(from).toBeCloseTo(-to, 9)
  })

  it('of a rectangle with cut corners', () => {
    const outline: Outline = { kind: 'rectangle', width: 1000, depth: 800, chamfer: 100 }
    expect(cut(outline, 0, 0)).toEqual([-500, 500])
    expect(cut(outline, 0, 350)[1]).toBeCloseTo(450, 10)
  })

  it('of a polygon with a notch, in two intervals', () => {
    const outline: Outline = {
      kind: 'polygon',
      points: [
        [-500, -400],
        [500, -400],
        [500, 400],
        [0, 100],
        [-500, 400],
      ],
    }
    const axes = createBendingAxes(outline, 0)
    const ends = cut(outline, 0, 250 - axes.origin[1])
    expect(ends).toHaveLength(4)
    expect(ends[0]).toBeCloseTo(-500, 9)
    expect(ends[1]).toBeCloseTo(-250, 9)
    expect(ends[2]).toBeCloseTo(250, 9)
    expect(ends[3]).toBeCloseTo(500, 9)
  })
})

describe('circles', () => {
  it('have half chords, none outside', () => {
    expect(computeHalfChord(5, 3)).toBe(4)
    expect(computeHalfChord(5, 5)).toBe(0)
    expect(computeHalfChord(5, 6)).toBe(0)
  })

  it('cross where both are as far as their radii', () => {
    const one = { u: 10, v: 20, radius: 50 }
    const other = { u: 40, v: 60, radius: 30 }
    const crossings = findCrossings(one, other)
    expect(crossings).toHaveLength(2)
    for (const v of crossings) {
      const reach = [1, -1].map((side) => one.u + side * computeHalfChord(one.radius, v - one.v))
      const distances = reach.map((u) => Math.abs(Math.hypot(u - other.u, v - other.v) - other.radius))
      expect(Math.min(...distances)).toBeLessThan(1e-9)
    }
  })

  it('do not cross when apart, touching, one inside the other, or the same', () => {
    const one = { u: 0, v: 0, radius: 50 }
    for (const other of [
      { u: 101, v: 0, radius: 50 },
      { u: 100, v: 0, radius: 50 },
      { u: 5, v: 0, radius: 40 },
      { u: 10, v: 0, radius: 40 },
      one,
    ]) {
      expect(findCrossings(one, other)).toEqual([])
    }
  })
})
