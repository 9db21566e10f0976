import { describe, expect, it } from 'vitest'
import { barSeries } from '#shared/catalogue/bars.ts'

/** Masses of the same tables, kg/m (inch-pound: lb/ft), in the order of the sizes: a digit that slipped shows here. */
const masses: Record<string, number[]> = {
  'astm-inch-pound': [0.376, 0.668, 1.043, 1.502, 2.044, 2.67, 3.4, 4.303, 5.313, 7.65, 13.6],
  'astm-metric': [0.56, 0.994, 1.552, 2.235, 3.042, 3.973, 5.06, 6.404, 7.907, 11.38, 20.24],
  'en-10080': [0.222, 0.395, 0.617, 0.888, 1.578, 2.466, 3.853, 6.313, 9.86, 15.41],
  'cns-560': [0.56, 0.994, 1.56, 2.25, 3.04, 3.98, 5.08, 6.39, 7.9, 9.57, 11.4, 15.5, 20.2],
  'jis-g-3112': [0.249, 0.56, 0.995, 1.56, 2.25, 3.04, 3.98, 5.04, 6.23, 7.51, 8.95, 10.5, 15.9],
}
const kgPerMetreOfLbPerFoot = 0.45359237 / 0.3048

describe.each(barSeries.map((series) => [series.id, series] as const))('%s', (id, { sizes, source }) => {
  it('rises, with names of their own and a source', () => {
    expect(new Set(sizes.map((size) => size.name)).size).toBe(sizes.length)
    for (let i = 1; i < sizes.length; i++) {
      expect(sizes[i].diameter).toBeGreaterThan(sizes[i - 1].diameter)
      expect(sizes[i].area).toBeGreaterThan(sizes[i - 1].area)
    }
    expect(source).not.toBe('')
  })

  it('areas are those of the diameters, and give the masses of the table at 7850 kg/m³', () => {
    const isAstm = id.startsWith('astm')
    // ASTM rounds areas to 0.01 in²: 0.20 in² for 0.1963 in² of #4. The others are exact to four figures, masses to three.
    const tolerance = isAstm ? { area: 0.02, mass: 0.02 } : { area: 0.0005, mass: 0.003 }
    const factor = id === 'astm-inch-pound' ? kgPerMetreOfLbPerFoot : 1
    expect(sizes).toHaveLength(masses[id].length)
    sizes.forEach(({ name, diameter, area }, i) => {
      const ofCircle = area / ((Math.PI * diameter ** 2) / 4)
      const ofMass = (area * 7.85e-3) / (masses[id][i] * factor)
      expect(Math.abs(ofCircle - 1), `${name}: area over that of the circle ${ofCircle}`).toBeLessThan(
        tolerance.area,
      )
      expect(Math.abs(ofMass - 1), `${name}: mass of the area over the table's ${ofMass}`).toBeLessThan(
        tolerance.mass,
      )
    })
  })
})

it('inch-pound sizes are inches and square inches', () => {
  const inches: [string, number, number][] = [
    ['#3', 0.375, 0.11],
    ['#5', 0.625, 0.31],
    ['#8', 1, 0.79],
    ['#9', 1.128, 1],
    ['#10', 1.27, 1.27],
    ['#11', 1.41, 1.56],
    ['#14', 1.693, 2.25],
    ['#18', 2.257, 4],
  ]
  const [series] = barSeries
  for (const [name, diameter, area] of inches) {
    const size = series.sizes.find((one) => one.name === name)
    expect(size?.diameter, name).toBeCloseTo(diameter * 25.4, 2)
    expect(size?.area, name).toBeCloseTo(area * 25.4 ** 2, 1)
  }
})
