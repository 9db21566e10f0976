/**
 * Hatching tells the confining stress: the density of lines is proportional to it. Every spiral has its own family of
 * lines, so an overlap carries both, and its ink is the sum as its stress is.
 */
import type { Spiral } from '#shared/document/analysisDocument.ts'

/** px between lines at 1 MPa. */
const spacingAtOne = 19
const least = 3.5
const greatest = 24

export interface HatchFamily {
  id: string
  /** px between lines; null: no confining stress, no hatch */
  spacing: number | null
  /** Degrees from the x axis, counter-clockwise on paper. */
  direction: 45 | -45 | 0 | 90
}

/** px between hatch lines for a confining stress (MPa); null without any. */
export function computeHatchSpacing(confiningStress: number, constant = spacingAtOne): number | null {
  if (!(confiningStress > 0)) return null
  return Math.min(greatest, Math.max(least, constant / confiningStress))
}

/** A constant at which no family is clamped, where one exists: the usual one if it will do. */
export function chooseHatchConstant(stresses: readonly number[]): number {
  const positive = stresses.filter((stress) => stress > 0)
  if (positive.length === 0) return spacingAtOne
  const high = Math.max(...positive)
  const low = Math.min(...positive)
  if (spacingAtOne / high < least) return least * high
  if (spacingAtOne / low > greatest) return Math.max(greatest * low, least * high)
  return spacingAtOne
}

/** Families for all spirals; spirals that overlap never share a direction as long as four directions suffice. */
export function createHatchFamilies(
  spirals: readonly Spiral[],
  stressOf: (id: string) => number | undefined,
): HatchFamily[] {
  const constant = chooseHatchConstant(spirals.map((spiral) => stressOf(spiral.id) ?? 0))
  const directions: HatchFamily['direction'][] = [45, -45, 0, 90]
  const families: HatchFamily[] = []
  spirals.forEach((spiral, i) => {
    const taken = families.filter((_, k) => doOverlap(spirals[k], spiral)).map((family) => family.direction)
    const direction = directions.find((one) => !taken.includes(one)) ?? directions[i % directions.length]
    families.push({
      id: spiral.id,
      direction,
      spacing: computeHatchSpacing(stressOf(spiral.id) ?? 0, constant),
    })
  })
  return families
}

function doOverlap(a: Spiral, b: Spiral): boolean {
  const distance = Math.hypot(a.centre[0] - b.centre[0], a.centre[1] - b.centre[1])
  return distance < (a.diameter + b.diameter) / 2
}
