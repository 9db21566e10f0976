/**
 * Hatching tells the confining stress: the density of lines is proportional to it. Every spiral has its own family of
 * lines, so an overlap carries both, and its ink is the sum as its stress is.
 */
import type { Spiral } from '#shared/document/analysisDocument.ts'

/** px between lines at 1 MPa. */
export const usualHatchConstant = 19
const least = 3.5
const greatest = 24

/** Degrees from the x axis, counter-clockwise on paper, in the order in which they are given out. */
const directions = [45, -45, 0, 90, 22.5, -67.5, 67.5, -22.5] as const
export type HatchDirection = (typeof directions)[number]

export interface HatchFamily {
  id: string
  /** px between lines; null: no confining stress, no hatch */
  spacing: number | null
  direction: HatchDirection
}

/** px between hatch lines for a confining stress (MPa, >= 0); null without any. `constant`: px at 1 MPa. */
export function computeHatchSpacing(confiningStress: number, constant = usualHatchConstant): number | null {
  if (!(confiningStress > 0)) return null
  return Math.min(greatest, Math.max(least, constant / confiningStress))
}

/**
 * px at 1 MPa for one drawing: the usual constant where no stress (MPa) is clamped by it, else one by which none is, or,
 * where the stresses lie too far apart, one that draws the strongest as dense as may be.
 */
export function chooseHatchConstant(stresses: readonly number[]): number {
  const positive = stresses.filter((stress) => stress > 0)
  if (positive.length === 0) return usualHatchConstant
  const lowest = least * Math.max(...positive)
  const highest = greatest * Math.min(...positive)
  return Math.max(lowest, Math.min(usualHatchConstant, highest))
}

/** One family for every spiral, in order; spirals that overlap never share a direction. */
export function createHatchFamilies(
  spirals: readonly Spiral[],
  stressOf: (id: string) => number | undefined,
): HatchFamily[] {
  const constant = chooseHatchConstant(spirals.map((spiral) => stressOf(spiral.id) ?? 0))
  const families: HatchFamily[] = []
  for (const spiral of spirals) {
    const taken = families.filter((_, k) => doOverlap(spirals[k], spiral)).map((family) => family.direction)
    families.push({
      id: spiral.id,
      direction: directions.find((one) => !taken.includes(one)) ?? directions[0],
      spacing: computeHatchSpacing(stressOf(spiral.id) ?? 0, constant),
    })
  }
  return families
}

/**
 * Path of the hatch lines within a circle (px). The lines belong to the paper, not to the circle: a spiral that is
 * dragged moves over them, and those of one direction run on from spiral to spiral.
 */
export function createCircleHatch(
  cx: number,
  cy: number,
  radius: number,
  spacing: number,
  direction: HatchDirection,
): string {
  const radians = (direction * Math.PI) / 180
  // Along the lines, and across them; y is down on the screen.
  const [ax, ay] = [Math.cos(radians), -Math.sin(radians)]
  const [nx, ny] = [-ay, ax]
  const middle = cx * nx + cy * ny
  const first = Math.ceil((middle - radius) / spacing)
  const last = Math.floor((middle + radius) / spacing)
  let path = ''
  for (let i = first; i <= last; i++) {
    const off = i * spacing - middle
    const half = Math.sqrt(Math.max(0, radius * radius - off * off))
    const [px, py] = [cx + off * nx, cy + off * ny]
    path += `M${write(px - half * ax)} ${write(py - half * ay)}L${write(px + half * ax)} ${write(py + half * ay)}`
  }
  return path
}

function doOverlap(a: Spiral, b: Spiral): boolean {
  const distance = Math.hypot(a.centre[0] - b.centre[0], a.centre[1] - b.centre[1])
  return distance < (a.diameter + b.diameter) / 2
}

function write(value: number): number {
  return Math.round(value * 100) / 100
}
