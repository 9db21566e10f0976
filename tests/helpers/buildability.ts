/** Distances that decide whether a cage can be assembled, mm. */
import type { AnalysisDocument, Spiral } from '#shared/document/analysisDocument.ts'
import { placeBars, type PlacedBar } from '#shared/geometry/bars.ts'
import { isWithinCircle } from '#shared/geometry/circles.ts'
import { computeClearance } from '#shared/geometry/outline.ts'

type Section = AnalysisDocument['section']

function measureFromCentre(spiral: Spiral, bar: PlacedBar): number {
  return Math.hypot(bar.x - spiral.centre[0], bar.y - spiral.centre[1])
}

/** The bar lies against the inside of the wire. */
function touches(spiral: Spiral, bar: PlacedBar): boolean {
  const touching = (spiral.diameter - spiral.barDiameter - bar.diameter) / 2
  return Math.abs(measureFromCentre(spiral, bar) - touching) < 0.5
}

/** Bars that lie against no wire. */
export function listLooseBars({ spirals, bars }: Section): PlacedBar[] {
  return placeBars(bars).filter((bar) => !spirals.some((spiral) => touches(spiral, bar)))
}

/** From each bar to each wire that it does not lie against, surface to surface. */
export function listWireGaps({ spirals, bars }: Section): { bar: PlacedBar; spiral: string; gap: number }[] {
  return placeBars(bars).flatMap((bar) =>
    spirals
      .filter((spiral) => !touches(spiral, bar))
      .map((spiral) => ({
        bar,
        spiral: spiral.id,
        gap:
          Math.abs(measureFromCentre(spiral, bar) - spiral.diameter / 2) -
          (spiral.barDiameter + bar.diameter) / 2,
      })),
  )
}

/** Clear distances of pairs of bars beside what is asked of them: max(1.5 d, 40 mm), ACI 318-19 25.2.3 (from memory). */
export function listBarGaps({ bars }: Section): { clear: number; asked: number }[] {
  const placed = placeBars(bars)
  return placed.flatMap((one, i) =>
    placed.slice(i + 1).map((other) => ({
      clear: Math.hypot(one.x - other.x, one.y - other.y) - (one.diameter + other.diameter) / 2,
      asked: Math.max(1.5 * Math.max(one.diameter, other.diameter), 40),
    })),
  )
}

/** Concrete over the outside of each spiral. */
export function listCovers({ outline, spirals }: Section): number[] {
  return spirals.map(
    (spiral) => computeClearance(outline, spiral.centre) - (spiral.diameter + spiral.barDiameter) / 2,
  )
}

/** Longitudinal bars inside both of two spirals that cross, and the pitches of the two. */
export function listInterlocks({
  spirals,
  bars,
}: Section): { pair: string; bars: number; pitches: number[] }[] {
  const placed = placeBars(bars)
  return spirals.flatMap((one, i) =>
    spirals
      .slice(i + 1)
      .filter(
        (other) =>
          Math.hypot(one.centre[0] - other.centre[0], one.centre[1] - other.centre[1]) <
          (one.diameter + other.diameter) / 2,
      )
      .map((other) => ({
        pair: `${one.id}-${other.id}`,
        bars: placed.filter(({ x, y }) => isWithinCircle(one, [x, y]) && isWithinCircle(other, [x, y]))
          .length,
        pitches: [one.pitch, other.pitch],
      })),
  )
}
