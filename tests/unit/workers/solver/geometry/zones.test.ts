/** Zones against closed forms: circles, lenses (two circular segments, computed apart in shared/geometry), rectangles. */
import { describe, expect, it } from 'vitest'
import type { Outline } from '#shared/document/analysisDocument.ts'
import { computeLensArea } from '#shared/geometry/circles.ts'
import { createBendingAxes } from '#workers/solver/geometry/axes.ts'
import { createOutlineChords, findCrossings, type TurnedCircle } from '#workers/solver/geometry/chords.ts'
import { createStations } from '#workers/solver/geometry/stations.ts'
import { computeZones } from '#workers/solver/geometry/zones.ts'

const square: Outline = { kind: 'rectangle', width: 2000, depth: 2000, chamfer: 0 }

function zonesOf(circles: TurnedCircle[], voids: TurnedCircle[] = [], outline = square) {
  const axes = createBendingAxes(outline, 0)
  const chords = createOutlineChords(outline, axes)
  const all = [...circles, ...voids]
  const breaks = all.flatMap((circle, i) => [
    circle.v - circle.radius,
    circle.v + circle.radius,
    ...all.slice(i + 1).flatMap((other) => findCrossings(circle, other)),
  ])
  const stations = createStations(axes.vBottom, axes.vTop, [...chords.breaks, ...breaks], 70)
  const zones = computeZones(stations, chords, voids, circles)
  return Object.fromEntries(zones.map((zone) => [toName(zone.spirals), zone]))
}

/** A letter a circle, so that an object keeps the order of its zones. */
function toName(set: readonly number[]): string {
  return set.length === 0 ? 'none' : set.map((index) => 'ABCDE'[index]).join('')
}

const circleArea = (radius: number) => Math.PI * radius * radius
/** Relative. A lens is cut into few strips: half a hundredth of the 0.2 % that moments may miss. */
const near = 1e-4

function expectArea(got: number, wanted: number) {
  expect(Math.abs(got / wanted - 1), `${got} for ${wanted}`).toBeLessThan(near)
}

describe('zones', () => {
  it('of one circle leave the rest unconfined', () => {
    const zones = zonesOf([{ u: 100, v: -50, radius: 500 }])
    expect(Object.keys(zones)).toEqual(['none', 'A'])
    expectArea(zones.A.total, circleArea(500))
    expectArea(zones.none.total, 4e6 - circleArea(500))
  })

  it('of two crossing circles have the area of the lens, in every direction', () => {
    for (const [u, v] of [
      [600, 0],
      [0, 600],
      [360, 480],
    ]) {
      const zones = zonesOf([
        { u: -u / 2, v: -v / 2, radius: 500 },
        { u: u / 2, v: v / 2, radius: 350 },
      ])
      const lens = computeLensArea(500, 350, 600)
      expect(Object.keys(zones)).toEqual(['none', 'A', 'AB', 'B'])
      expectArea(zones.AB.total, lens)
      expectArea(zones.A.total, circleArea(500) - lens)
      expectArea(zones.B.total, circleArea(350) - lens)
    }
  })

  it('of a large circle with four corner circles: lens 25501.42 mm2 each, union 683392.5 mm2', () => {
    const corners = [
      [300, 300],
      [-300, 300],
      [-300, -300],
      [300, -300],
    ].map(([u, v]) => ({ u, v, radius: 150 }))
    const zones = zonesOf([{ u: 0, v: 0, radius: 400 }, ...corners])
    for (const set of ['AB', 'AC', 'AD', 'AE']) expectArea(zones[set].total, 25501.42)
    expectArea(4e6 - zones.none.total, 683392.5)
  })

  it('of circles that coincide, touch or hold one another have no slivers', () => {
    const same = zonesOf([
      { u: 0, v: 0, radius: 400 },
      { u: 0, v: 0, radius: 400 },
    ])
    expect(Object.keys(same)).toEqual(['none', 'AB'])
    const touching = zonesOf([
      { u: -300, v: 0, radius: 300 },
      { u: 300, v: 0, radius: 300 },
    ])
    expect(Object.keys(touching)).toEqual(['none', 'A', 'B'])
    const within = zonesOf([
      { u: 0, v: 0, radius: 500 },
      { u: 300, v: 0, radius: 200 },
    ])
    expect(Object.keys(within)).toEqual(['none', 'A', 'AB'])
    expectArea(within.AB.total, circleArea(200))
  })

  it('leave voids out, wherever they lie', () => {
    const zones = zonesOf([{ u: 0, v: 0, radius: 500 }], [{ u: 450, v: 0, radius: 200 }])
    const lens = computeLensArea(500, 200, 450)
    expectArea(zones.A.total, circleArea(500) - lens)
    expectArea(zones.none.total, 4e6 - circleArea(500) - (circleArea(200) - lens))
  })

  it('have first moments about their own places', () => {
    const zones = zonesOf([{ u: 200, v: 100, radius: 300 }])
    const moment = zones.A.uMoment.reduce((sum, one) => sum + one, 0)
    expectArea(moment, 200 * circleArea(300))
  })

  it('may cover the whole section', () => {
    const zones = zonesOf([{ u: 0, v: 0, radius: 600 }], [], { kind: 'circle', diameter: 1000 })
    expect(Object.keys(zones)).toEqual(['A'])
  })
})
