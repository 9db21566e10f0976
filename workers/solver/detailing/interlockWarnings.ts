/**
 * Spirals that overlap. Limits of the centre distance: Tanaka & Park 1993 (ACI Struct. J. 90(2), 192-203) and Correal,
 * Saiidi, Sanders & El-Azazy 2007 (ACI Struct. J. 104(3), 314-323); at least four bars in the interlock: Benzoni,
 * Priestley & Seible 2000 (12th World Conf. Earthquake Eng., paper 1562).
 */
import type { AnalysisDocument, Spiral } from '#shared/document/analysisDocument.ts'
import type { Warning } from '#shared/document/analysisResult.ts'
import { placeBars, type PlacedBar } from '#shared/geometry/bars.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import { isInside } from '../section/spiralStates.ts'
import { mm } from './quantities.ts'

/** Centre distance over diameter of interlocking spirals of one size. */
const distanceShare = { least: 0.5, likely: 0.6, greatest: 0.75 }
const leastBarsInInterlock = 4
/** Relative difference of diameters up to which two spirals are of one size. */
const sameSize = 0.05

export function warnOfInterlock({ section }: AnalysisDocument, model: SectionModel): Warning[] {
  const { spirals } = section
  const warnings: Warning[] = []
  const bars = placeBars(section.bars)
  const pairs = listOverlaps(spirals)
  for (const [i, j] of pairs) {
    const one = spirals[i]
    const other = spirals[j]
    const path = `section.spirals[${j}]`
    const names = `${one.id} and ${other.id}`
    if (isOneSize(one, other)) warnings.push(...warnOfPair(one, other, path, bars))
    if (!doPitchesMesh(one, other)) {
      warnings.push({
        code: 'pitches-do-not-mesh',
        path: `${path}.pitch`,
        message: `Pitches of the overlapping spirals ${names} do not mesh: ${mm(one.pitch)} and ${mm(other.pitch)}; equal or whole multiples pass one another without clash.`,
        source: 'common practice',
      })
    }
  }
  if (pairs.length > 0) {
    warnings.push({
      code: 'overlap-untested',
      path: 'materials.confinement.overlap',
      message:
        'Strength where spirals overlap is not validated by test here: no interlocking or multi-spiral column with complete section data and a measured greatest moment is known to this program. The rule “largest” gives the lower bound.',
      source: 'equilibrium of superposed ring pressures; no test',
    })
  }
  const most = model.zones.reduce((count, zone) => Math.max(count, zone.spirals.length), 0)
  if (most > 2) {
    warnings.push({
      code: 'overlap-of-many',
      path: 'section.spirals',
      message: `Concrete lies inside ${most} spirals at once, beyond the geometry of any tested column.`,
      source: 'common practice',
    })
  }
  return warnings
}

function warnOfPair(one: Spiral, other: Spiral, path: string, bars: readonly PlacedBar[]): Warning[] {
  const warnings: Warning[] = []
  const diameter = Math.min(one.diameter, other.diameter)
  const share = computeDistance(one, other) / diameter
  const names = `${one.id} and ${other.id}`
  const shown = share.toFixed(2)
  if (share < distanceShare.least || share > distanceShare.greatest) {
    warnings.push({
      code: 'interlock-distance',
      path: `${path}.centre`,
      message: `Centre distance of the interlocking spirals ${names} is ${shown} of their diameter, tested columns have ${distanceShare.least} to ${distanceShare.greatest}.`,
      source: 'Correal, Saiidi, Sanders & El-Azazy 2007; least distance: common practice',
    })
  } else if (share > distanceShare.likely) {
    warnings.push({
      code: 'interlock-distance-large',
      path: `${path}.centre`,
      message: `Centre distance of the interlocking spirals ${names} is ${shown} of their diameter: above ${distanceShare.likely} crossties between them are needed where shear is moderate or high.`,
      source: 'Correal, Saiidi, Sanders & El-Azazy 2007',
    })
  }
  const inside = bars.filter((bar) => isInside(one, bar.x, bar.y) && isInside(other, bar.x, bar.y)).length
  if (inside < leastBarsInInterlock) {
    warnings.push({
      code: 'interlock-bars',
      path,
      message: `The interlock of ${names} holds ${inside} longitudinal bars, at least ${leastBarsInInterlock} are needed to carry the one spiral's force into the other.`,
      source: 'Benzoni, Priestley & Seible 2000',
    })
  }
  return warnings
}

/** Pairs of spirals whose centreline circles cross. */
function listOverlaps(spirals: readonly Spiral[]): [number, number][] {
  return spirals.flatMap((one, i) =>
    spirals.slice(i + 1).flatMap((other, k): [number, number][] => {
      const distance = computeDistance(one, other)
      const overlap = distance < (one.diameter + other.diameter) / 2 - 1e-6
      return overlap ? [[i, i + 1 + k]] : []
    }),
  )
}

function isOneSize(one: Spiral, other: Spiral): boolean {
  return Math.abs(one.diameter - other.diameter) <= sameSize * Math.max(one.diameter, other.diameter)
}

function doPitchesMesh(one: Spiral, other: Spiral): boolean {
  const ratio = Math.max(one.pitch, other.pitch) / Math.min(one.pitch, other.pitch)
  return Math.abs(ratio - Math.round(ratio)) < 1e-6
}

function computeDistance(one: Spiral, other: Spiral): number {
  return Math.hypot(one.centre[0] - other.centre[0], one.centre[1] - other.centre[1])
}
