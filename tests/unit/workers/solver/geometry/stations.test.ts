import { describe, expect, it } from 'vitest'
import { createStations } from '#workers/solver/geometry/stations.ts'

function sum(values: Float64Array): number {
  return values.reduce((total, value) => total + value, 0)
}

describe('stations', () => {
  it('stand for the whole depth, ascending, each within its cell', () => {
    const { v, weight, edges } = createStations(-300, 500, [-100, 200], 40)
    expect(sum(weight)).toBeCloseTo(800, 9)
    expect([edges[0], edges.at(-1)]).toEqual([-300, 500])
    for (let c = 0; c + 1 < edges.length; c++) {
      expect(edges[c]).toBeLessThan(v[2 * c])
      expect(v[2 * c]).toBeLessThan(v[2 * c + 1])
      expect(v[2 * c + 1]).toBeLessThan(edges[c + 1])
    }
  })

  it('have an edge on every break, which count once where they coincide', () => {
    const { edges } = createStations(-300, 500, [200, -100, 200 + 1e-8, 200, 700, -300], 40)
    expect([...edges]).toContain(-100)
    expect([...edges].filter((edge) => Math.abs(edge - 200) < 1e-6)).toHaveLength(1)
    for (let c = 0; c + 1 < edges.length; c++) expect(edges[c + 1] - edges[c]).toBeGreaterThan(1e-3)
  })

  it('give a short piece its least number of cells', () => {
    const { edges } = createStations(0, 1000, [999], 10, 3)
    expect([...edges].filter((edge) => edge >= 999)).toHaveLength(4)
  })

  it('integrate a chord, which starts like a square root, with the fourth power of the number of strips', () => {
    const radius = 500
    const miss = (strips: number) => {
      const { v, weight } = createStations(-radius, radius, [], strips)
      const area = weight.reduce((total, w, s) => total + 2 * w * Math.sqrt(radius ** 2 - v[s] ** 2), 0)
      return Math.abs(area / (Math.PI * radius ** 2) - 1)
    }
    expect(miss(20)).toBeLessThan(1e-5)
    expect(miss(20) / miss(40)).toBeGreaterThan(12)
  })
})
