/** What no solution may be, whatever the section. */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'
import {
  solveMomentCurvature,
  type MomentCurvatureSolution,
} from '#workers/solver/analyses/momentCurvature.ts'

export type Solved =
  | { status: 'solved'; solution: MomentCurvatureSolution; milliseconds: number }
  | { status: 'threw'; error: Error }

const reasons = new Set([
  'spiral-fracture',
  'bar-rupture',
  'void-face',
  'moment-drop-20',
  'moment-lost',
  'no-equilibrium',
  'curvature-limit',
])
/** Of f'co Ag: the contract's stopping test. */
const residualAllowed = 1e-6
/** A hundred times what a plain section takes, for a loaded machine. */
const millisecondsAllowed = 2000
/**
 * Strips that a refined run has, and how far (relative) its end may lie from that of the plain one: where cover and bars give
 * way together, curves drop all but vertically, and the end lies somewhere on the drop.
 */
const refinedStrips = 400
const endMoves = 1e-2
/** Of f'co Ag times the depth: with no bar and no load worth the name the curve is rounding. */
const leastMoment = 1e-7

export function solveTimed(document: AnalysisDocument): Solved {
  const startedAt = performance.now()
  try {
    const solution = solveMomentCurvature(document)
    return { status: 'solved', solution, milliseconds: performance.now() - startedAt }
  } catch (error) {
    return { status: 'threw', error: error instanceof Error ? error : new Error(String(error)) }
  }
}

/** The first thing that is wrong with a solution; null: nothing. */
export function findFault(document: AnalysisDocument, solved: Solved): string | null {
  if (solved.status === 'threw') return `threw ${solved.error.stack}`
  const { solution, milliseconds } = solved
  const { points, stop, limitStates } = solution
  if (!reasons.has(stop.reason)) return `stops for no stated reason: ${stop.reason}`
  const unnumbered = findUnnumbered(solution, 'solution')
  if (unnumbered) return `${unnumbered} is no finite number`
  const { curvature, residual } = points
  const disordered = curvature.findIndex((value, i) => i > 0 && !(value > curvature[i - 1]))
  if (disordered !== -1) return `curvature does not grow at row ${disordered}`
  if (curvature.length > 0 && curvature[0] !== 0) return `starts at ${curvature[0]}`
  const size = document.materials.concrete.strength * computeOutlineArea(document.section.outline)
  const worst = Math.max(0, ...residual) / size
  if (worst > residualAllowed) return `residual ${worst} f'co Ag`
  const stray = limitStates.find((state) => !curvature.includes(state.curvature))
  if (stray) return `${stray.kind} is no row`
  if (milliseconds > millisecondsAllowed) return `takes ${milliseconds} ms`
  return findMovedEnd(document, solution)
}

/** The reason and the curvature of the end are those of a finer integration. */
function findMovedEnd(document: AnalysisDocument, { stop, points }: MomentCurvatureSolution): string | null {
  const finer = solveMomentCurvature(document, { strips: refinedStrips })
  const end = points.curvature.at(-1) ?? 0
  const finerEnd = finer.points.curvature.at(-1) ?? 0
  const moves = Math.abs(end - finerEnd) > endMoves * finerEnd
  const changes = stop.reason !== finer.stop.reason
  // Two ends at one curvature are two names of one end.
  if (!moves || (end === 0 && finerEnd === 0)) return null
  const area = computeOutlineArea(document.section.outline)
  const scale = document.materials.concrete.strength * area * Math.sqrt(area)
  if (Math.max(...points.moment) < leastMoment * scale) return null
  return `ends by ${stop.reason} at ${end}, refined by ${finer.stop.reason} at ${finerEnd}${changes ? '' : ' too'}`
}

function findUnnumbered(value: unknown, path: string): string | null {
  if (typeof value === 'number') return Number.isFinite(value) ? null : path
  if (typeof value !== 'object' || value === null) return null
  for (const [key, inner] of Object.entries(value)) {
    const found = findUnnumbered(inner, `${path}.${key}`)
    if (found) return found
  }
  return null
}
