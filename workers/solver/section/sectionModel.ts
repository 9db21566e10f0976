/**
 * A section turned into flat typed arrays for one direction of bending: the only file that knows both sides.
 *
 * Layout: stations are shared by all laws, two a cell, ascending in v. Zones with the same confining stress share a law;
 * each law has an area and a first moment in u for every station, and the ranges of cells in which it has any area.
 * Bars are parallel arrays. Units N, mm, MPa; compression positive.
 */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { createBendingAxes, toU, toV, type BendingAxes } from '../geometry/axes.ts'
import { createOutlineChords, findCrossings, type TurnedCircle } from '../geometry/chords.ts'
import { createStations, type Stations } from '../geometry/stations.ts'
import { computeZones, type ZoneGeometry } from '../geometry/zones.ts'
import { createConcreteLaw, type ConcreteLaw } from './concreteLaw.ts'
import { computeSpiralStates, isInside, isRound, type SpiralState } from './spiralStates.ts'
import { createSteelLaw, type SteelLaw } from './steelLaw.ts'

export interface ConcreteFibers {
  law: ConcreteLaw
  /** mm2 by station */
  area: Float64Array
  /** mm3 by station */
  uMoment: Float64Array
  /** Cells [from, to) with area: from, to, from, to ... */
  ranges: Int32Array
}

export interface BarFibers {
  count: number
  v: Float64Array
  u: Float64Array
  area: Float64Array
  /** Bars [from, to) of one steel in one concrete lie together. */
  groups: BarRange[]
}

export interface BarRange {
  from: number
  to: number
  /** Index into `steels`. */
  steel: number
  /** Index into `concretes`: the law of the concrete that the bars displace. */
  displaced: number
}

export interface Zone extends ZoneGeometry {
  confiningStress: number
  law: ConcreteLaw
}

export interface SectionModel {
  axes: BendingAxes
  stations: Stations
  zones: Zone[]
  concretes: ConcreteFibers[]
  bars: BarFibers
  steels: SteelLaw[]
  steelNames: string[]
  spirals: SpiralState[]
  /** v of the most compressed point of each spiral's centreline circle. */
  spiralTops: number[]
  /** Voids whose face is free and limits the strain: index in the section and v of the most compressed point. */
  freeFaces: { index: number; top: number }[]
  /** Every fiber has its mirror image about the v axis: there is no moment about the other axis. */
  symmetric: boolean
  /** Gross area, voids not deducted, mm2. */
  grossArea: number
  /** Number of area pieces and bars that a resultant sums. */
  fibers: number
}

/** Strips over the depth of a section where nothing else is asked for. */
const defaultStrips = 70

export interface ModelOptions {
  /** Strips over the depth; pieces between breaks have their own on top. @default 70 */
  strips?: number
}

/** A void larger than this share of the diameter of any spiral round it limits the strain at its face. */
const freeFaceShare = 0.15
/** Tables reach past the largest ultimate strain, since only limit states end the analysis. */
const tableReach = 1.1

export function createSectionModel(
  document: AnalysisDocument,
  grossArea: number,
  { strips = defaultStrips }: ModelOptions = {},
): SectionModel {
  const { section, materials, analysis } = document
  const axes = createBendingAxes(section.outline, analysis.angle)
  const outline = createOutlineChords(section.outline, axes)
  const turn = ({
    centre: [x, y],
    diameter,
  }: {
    centre: [number, number]
    diameter: number
  }): TurnedCircle => ({
    u: toU(axes, x, y),
    v: toV(axes, x, y),
    radius: diameter / 2,
  })
  const circles = section.spirals.map(turn)
  const voids = section.voids.map(turn)
  const stations = createStations(
    axes.vBottom,
    axes.vTop,
    [...outline.breaks, ...findBreaks(circles, voids)],
    strips,
  )

  const spirals = computeSpiralStates(document)
  const pressureOf = (set: readonly number[]) => {
    const stresses = set.map((index) => spirals[index].confiningStress)
    if (materials.confinement.overlap === 'largest') return Math.max(0, ...stresses)
    return stresses.reduce((sum, stress) => sum + stress, 0)
  }
  const tableTop =
    tableReach *
    spirals.reduce((most, spiral) => Math.max(most, spiral.ultimateStrain), materials.concrete.spallingStrain)

  const concretes: ConcreteFibers[] = []
  const findConcrete = (confiningStress: number): number => {
    const known = concretes.findIndex((one) => isSame(one.law.confiningStress, confiningStress))
    if (known !== -1) return known
    const size = stations.v.length
    concretes.push({
      law: createConcreteLaw(materials.concrete, confiningStress, tableTop),
      area: new Float64Array(size),
      uMoment: new Float64Array(size),
      ranges: new Int32Array(0),
    })
    return concretes.length - 1
  }

  const zones = computeZones(stations, outline, voids, circles).map((zone): Zone => {
    const confiningStress = pressureOf(zone.spirals)
    const fibers = concretes[findConcrete(confiningStress)]
    for (let s = 0; s < zone.area.length; s++) {
      fibers.area[s] += zone.area[s]
      fibers.uMoment[s] += zone.uMoment[s]
    }
    return { ...zone, confiningStress, law: fibers.law }
  })

  const steelNames = Object.keys(materials.steels)
  const placed = placeBars(section.bars)
  const bars = layBars(
    placed.map((bar) => {
      const set = section.spirals.flatMap((spiral, index) => (isInside(spiral, bar.x, bar.y) ? [index] : []))
      return {
        v: toV(axes, bar.x, bar.y),
        u: toU(axes, bar.x, bar.y),
        area: bar.area,
        steel: steelNames.indexOf(bar.steel),
        displaced: findConcrete(pressureOf(set)),
      }
    }),
  )
  for (const fibers of concretes) fibers.ranges = findRanges(fibers.area)

  return {
    axes,
    stations,
    zones,
    concretes,
    bars,
    steels: Object.values(materials.steels).map((steel) => createSteelLaw(steel)),
    steelNames,
    spirals,
    spiralTops: circles.map((circle) => circle.v + circle.radius),
    freeFaces: section.voids.flatMap((hole, index) => {
      const limits =
        !hole.lining &&
        section.spirals.some(
          (spiral) => isRound(spiral, hole) && hole.diameter > freeFaceShare * spiral.diameter,
        )
      return limits ? [{ index, top: voids[index].v + voids[index].radius }] : []
    }),
    symmetric: isSymmetric(concretes, bars, axes),
    grossArea,
    fibers:
      placed.length + concretes.reduce((sum, one) => sum + one.area.filter((area) => area !== 0).length, 0),
  }
}

/** Bars sorted by steel and displaced concrete, so that the inner loop of the resultants knows one of each. */
function layBars(
  placed: { v: number; u: number; area: number; steel: number; displaced: number }[],
): BarFibers {
  const sorted = [...placed].sort((a, b) => a.steel - b.steel || a.displaced - b.displaced)
  const groups: BarRange[] = []
  sorted.forEach(({ steel, displaced }, i) => {
    const last = groups.at(-1)
    if (last && last.steel === steel && last.displaced === displaced) last.to = i + 1
    else groups.push({ from: i, to: i + 1, steel, displaced })
  })
  return {
    count: sorted.length,
    v: Float64Array.from(sorted, (bar) => bar.v),
    u: Float64Array.from(sorted, (bar) => bar.u),
    area: Float64Array.from(sorted, (bar) => bar.area),
    groups,
  }
}

/** Poles of all circles and the points in which they cross. */
function findBreaks(circles: readonly TurnedCircle[], voids: readonly TurnedCircle[]): number[] {
  const all = [...circles, ...voids]
  return all.flatMap((circle, i) => [
    circle.v - circle.radius,
    circle.v + circle.radius,
    ...all.slice(i + 1).flatMap((other) => findCrossings(circle, other)),
  ])
}

/** Within rounding: first moments of all stations vanish, and bars stand in pairs. */
function isSymmetric(concretes: readonly ConcreteFibers[], bars: BarFibers, axes: BendingAxes): boolean {
  const tiny = 1e-9 * (axes.vTop - axes.vBottom)
  for (const { area, uMoment } of concretes) {
    for (let s = 0; s < area.length; s++) if (Math.abs(uMoment[s]) > tiny * area[s]) return false
  }
  return bars.groups.every(({ from, to }) => {
    for (let i = from; i < to; i++) {
      let paired = false
      for (let j = from; j < to && !paired; j++) {
        paired =
          Math.abs(bars.v[i] - bars.v[j]) <= tiny &&
          Math.abs(bars.u[i] + bars.u[j]) <= tiny &&
          bars.area[i] === bars.area[j]
      }
      if (!paired) return false
    }
    return true
  })
}

/** Equal but for the order in which sums were taken. */
function isSame(a: number, b: number): boolean {
  return Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b))
}

function findRanges(area: Float64Array): Int32Array {
  const ranges: number[] = []
  const cells = area.length / 2
  let from = -1
  for (let c = 0; c <= cells; c++) {
    const any = c < cells && (area[2 * c] !== 0 || area[2 * c + 1] !== 0)
    if (any && from === -1) from = c
    if (!any && from !== -1) {
      ranges.push(from, c)
      from = -1
    }
  }
  return Int32Array.from(ranges)
}
