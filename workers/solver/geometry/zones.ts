/**
 * Zones: the parts of a section that lie inside the same set of spirals. Interval arithmetic on the stations' lines
 * gives the width of every zone at every station, however the circles overlap.
 */
import { computeHalfChord, type OutlineChords, type TurnedCircle } from './chords.ts'
import type { Stations } from './stations.ts'

export interface ZoneGeometry {
  /** Indices of the spirals round the zone, ascending; [] is unconfined concrete. */
  spirals: number[]
  /** Area (mm2) that each station stands for. */
  area: Float64Array
  /** First moment (mm3) that each station stands for: integral of u. */
  uMoment: Float64Array
  /** mm2 */
  total: number
}

/** Zones with less than this share of the gross area are touches of circles, not concrete. */
const sliver = 1e-10

/** All zones of positive area in the order of their sets; voids are left out. */
export function computeZones(
  stations: Stations,
  outline: OutlineChords,
  voids: readonly TurnedCircle[],
  circles: readonly TurnedCircle[],
): ZoneGeometry[] {
  const zones = new Map<number | string, ZoneGeometry>()
  const ends = new Float64Array(outline.most)
  const cuts = createCutList(outline.most + 2 * (voids.length + circles.length))
  const spiralChords = createChordList(circles)
  const voidChords = createChordList(voids)

  for (let s = 0; s < stations.v.length; s++) {
    const v = stations.v[s]
    const weight = stations.weight[s]
    const endCount = outline.cut(v, ends)
    spiralChords.cut(v)
    voidChords.cut(v)
    for (let e = 0; e + 1 < endCount; e += 2) {
      cuts.start(ends[e], ends[e + 1])
      spiralChords.addTo(cuts)
      voidChords.addTo(cuts)
      for (let i = 0; i + 1 < cuts.count; i++) {
        const a = cuts.ends[i]
        const b = cuts.ends[i + 1]
        const middle = (a + b) / 2
        if (b <= a || voidChords.holds(middle)) continue
        const key = spiralChords.nameSet(middle)
        let zone = zones.get(key)
        if (!zone) {
          const inside = spiralChords.listAround(middle)
          const size = stations.v.length
          zone = { spirals: inside, area: new Float64Array(size), uMoment: new Float64Array(size), total: 0 }
          zones.set(key, zone)
        }
        zone.area[s] += (b - a) * weight
        zone.uMoment[s] += ((b * b - a * a) / 2) * weight
      }
    }
  }

  let gross = 0
  for (const zone of zones.values()) {
    zone.total = zone.area.reduce((sum, area) => sum + area, 0)
    gross += zone.total
  }
  return [...zones.values()]
    .filter((zone) => zone.total > sliver * gross)
    .sort((a, b) => compareSets(a.spirals, b.spirals))
}

/** Sums of so many powers of two are exact. */
const mostExactPowers = 52
const powers = Array.from({ length: mostExactPowers }, (_, c) => 2 ** c)

/** The shorter set first where one begins the other, else by the first index that differs. */
function compareSets(a: readonly number[], b: readonly number[]): number {
  const i = a.findIndex((value, place) => value !== b[place])
  if (i === -1) return a.length - b.length
  return b[i] === undefined ? 1 : a[i] - b[i]
}

interface CutList {
  ends: Float64Array
  count: number
  start(a: number, b: number): void
  insert(u: number): void
}

/** Ends of chords within one interval, kept in order. */
function createCutList(capacity: number): CutList {
  const ends = new Float64Array(capacity + 2)
  return {
    ends,
    count: 0,
    start(a, b) {
      ends[0] = a
      ends[1] = b
      this.count = 2
    },
    insert(u) {
      const last = this.count - 1
      if (!(u > ends[0] && u < ends[last])) return
      let place = last + 1
      while (ends[place - 1] > u) {
        ends[place] = ends[place - 1]
        place -= 1
      }
      ends[place] = u
      this.count += 1
    },
  }
}

/** Chords of a list of circles on the line at hand; an empty chord ends before it begins, so it holds no point. */
function createChordList(circles: readonly TurnedCircle[]) {
  const from = new Float64Array(circles.length)
  const to = new Float64Array(circles.length)
  return {
    cut(v: number) {
      for (let c = 0; c < circles.length; c++) {
        const half = computeHalfChord(circles[c].radius, v - circles[c].v)
        from[c] = half > 0 ? circles[c].u - half : Infinity
        to[c] = half > 0 ? circles[c].u + half : -Infinity
      }
    },
    addTo(cuts: CutList) {
      for (let c = 0; c < circles.length; c++) {
        cuts.insert(from[c])
        cuts.insert(to[c])
      }
    },
    holds(u: number): boolean {
      for (let c = 0; c < circles.length; c++) if (from[c] < u && u < to[c]) return true
      return false
    },
    /** A key of the set of circles whose chord holds u: a sum of powers of two while those are exact. */
    nameSet(u: number): number | string {
      if (circles.length > mostExactPowers) return this.listAround(u).join()
      let key = 0
      for (let c = 0; c < circles.length; c++) if (from[c] < u && u < to[c]) key += powers[c]
      return key
    },
    /** Indices of the circles whose chord holds u, ascending. */
    listAround(u: number): number[] {
      const inside: number[] = []
      for (let c = 0; c < circles.length; c++) if (from[c] < u && u < to[c]) inside.push(c)
      return inside
    },
  }
}
