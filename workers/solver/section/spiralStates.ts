/** What every spiral of a section does by itself: the numbers printed for it and the stress it confines with. */
import type { AnalysisDocument, Spiral, Void } from '#shared/document/analysisDocument.ts'
import { placeBars, type PlacedBar } from '#shared/geometry/bars.ts'
import {
  computeConfiningStress,
  computeEffectiveness,
  computeMassPerLength,
  computeUltimateStrain,
  computeVolumetricRatio,
} from '../materials/confinement.ts'
import { computeConfinedPeakStrain, computeConfinedStrength } from '../materials/manderConfined.ts'

export interface SpiralState {
  spiral: Spiral
  /** Longitudinal bars whose centres lie inside the centreline circle: number and area (mm2). */
  barsInside: number
  barAreaInside: number
  /** barAreaInside over the core area. */
  rhoCc: number
  volumetricRatio: number
  effectiveness: number
  /** Index of the unsupported void whose face is so near that the spiral confines nothing. */
  idleByVoid: number | null
  /** MPa */
  confiningStress: number
  confinedStrength: number
  peakStrain: number
  ultimateStrain: number
  /** kg/mm */
  massPerLength: number
}

/** A spiral round an unsupported void confines nothing where less than this share of its diameter is left. */
const leastWallShare = 0.1

export function computeSpiralStates(document: AnalysisDocument): SpiralState[] {
  const { section, materials } = document
  const bars = placeBars(section.bars)
  return section.spirals.map((spiral) => computeSpiralState(spiral, bars, section.voids, materials))
}

function computeSpiralState(
  spiral: Spiral,
  bars: readonly PlacedBar[],
  voids: readonly Void[],
  { concrete, steels, confinement }: AnalysisDocument['materials'],
): SpiralState {
  const steel = steels[spiral.steel]
  const ds = spiral.diameter
  const inside = bars.filter((bar) => isInside(spiral, bar.x, bar.y))
  const barAreaInside = inside.reduce((sum, bar) => sum + bar.area, 0)
  const rhoCc = barAreaInside / ((Math.PI * ds * ds) / 4)
  const volumetricRatio = computeVolumetricRatio(spiral.barArea, ds, spiral.pitch)
  const effectiveness = computeEffectiveness(spiral.form, spiral.pitch - spiral.barDiameter, ds, rhoCc)
  const idleByVoid = findIdlingVoid(spiral, voids)
  const confines = confinement.strength !== 'none' && idleByVoid === null
  const confiningStress = confines
    ? computeConfiningStress(effectiveness, volumetricRatio, steel.yieldStrength)
    : 0
  const confinedStrength = computeConfinedStrength(concrete.strength, confiningStress)
  return {
    spiral,
    barsInside: inside.length,
    barAreaInside,
    rhoCc,
    volumetricRatio,
    effectiveness,
    idleByVoid,
    confiningStress,
    confinedStrength,
    peakStrain: computeConfinedPeakStrain(concrete.peakStrain, concrete.strength, confinedStrength),
    ultimateStrain: computeUltimateStrain(
      volumetricRatio,
      steel.yieldStrength,
      // The reader lets no spiral pass whose steel lacks it.
      steel.strainAtMaximumStress ?? 0,
      confinedStrength,
    ),
    massPerLength: computeMassPerLength(spiral.form, spiral.barArea, ds, spiral.pitch),
  }
}

/** Within the centreline circle, the circle itself included. */
export function isInside(spiral: Spiral, x: number, y: number): boolean {
  return Math.hypot(x - spiral.centre[0], y - spiral.centre[1]) <= spiral.diameter / 2
}

/** "Round it": the void lies wholly inside the spiral's centreline circle. */
export function isRound(spiral: Spiral, hole: Void): boolean {
  return computeOffset(spiral, hole) + hole.diameter / 2 <= spiral.diameter / 2
}

function findIdlingVoid(spiral: Spiral, voids: readonly Void[]): number | null {
  const index = voids.findIndex((hole) => {
    if (hole.lining || !isRound(spiral, hole)) return false
    const wall = (spiral.diameter - hole.diameter) / 2 - computeOffset(spiral, hole)
    return wall < leastWallShare * spiral.diameter
  })
  return index === -1 ? null : index
}

function computeOffset(spiral: Spiral, hole: Void): number {
  return Math.hypot(spiral.centre[0] - hole.centre[0], spiral.centre[1] - hole.centre[1])
}
