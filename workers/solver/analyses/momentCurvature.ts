/**
 * Moment-curvature of a section under an axial load: curvature-driven, on the branch of equilibrium connected with zero
 * curvature. Free of path: every fiber follows its first-loading law at its present strain.
 *
 * Stopping test at every row: |N - load| <= 1e-7 f'co Ag (the contract asks for 1e-6). Outcomes are values: a section
 * without equilibrium at zero curvature gives empty points and the reason `no-equilibrium`; a fold of the branch ends
 * the curve with the same reason and the rows up to it.
 */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type {
  CurvePoints,
  LimitState,
  MomentCurvatureResult,
  SpiralResult,
  ZoneResult,
} from '#shared/document/analysisResult.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'
import { listWarnings } from '../detailing/warnings.ts'
import { createEquilibriumSolver, findStart, type StartRange } from '../section/equilibrium.ts'
import { computeCrossMoment } from '../section/resultants.ts'
import { createSectionModel, type ModelOptions, type SectionModel } from '../section/sectionModel.ts'
import { readState, type BranchState } from './branch.ts'
import { idealiseCurve } from './idealise.ts'
import { findRow, insertRows, layRows } from './rows.ts'
import { findDrop, locatePeak, walkBranch, type BranchContext, type ReachedLimit } from './walk.ts'
import { findBarExtent, listWatchedStrains } from './watched.ts'
import { listWorking } from './working.ts'

/** Everything of the result but the document, its digest and the clock. */
export type MomentCurvatureSolution = Pick<
  MomentCurvatureResult,
  'warnings' | 'spirals' | 'zones' | 'points' | 'limitStates' | 'idealised' | 'stop' | 'working'
> & { diagnostics: Omit<MomentCurvatureResult['diagnostics'], 'milliseconds'> }

/** Tensile strain to which a section is followed at zero curvature where its bars have no limit strain. */
const leastStrainWithoutLimit = -0.1

/** Strips where the branch folds or all but folds: errors fall with the fourth power of their number. */
const strictStrips = 420
/**
 * The branch all but folds where d eps0 / d kappa exceeds this share of the depth: the strain then turns about a point far
 * outside the section, since softening concrete cancels nearly all axial stiffness.
 */
const foldingSlope = 2

/**
 * The curve of a filled, sound document. Whether a strongly softening section folds hangs on a small difference of large
 * stiffnesses, so such curves are solved again on finer strips. Strips that are asked for are taken as they are.
 */
export function solveMomentCurvature(
  document: AnalysisDocument,
  options: ModelOptions = {},
): MomentCurvatureSolution {
  const { solution, folding } = solveOnStrips(document, options)
  if (!folding || options.strips !== undefined) return solution
  return solveOnStrips(document, { ...options, strips: strictStrips }).solution
}

interface StripSolution {
  solution: MomentCurvatureSolution
  /** The branch folds or comes near it. */
  folding: boolean
}

function solveOnStrips(document: AnalysisDocument, options: ModelOptions): StripSolution {
  const { analysis, materials } = document
  const load = analysis.axialLoad
  const model = createSectionModel(document, computeOutlineArea(document.section.outline), options)
  const solver = createEquilibriumSolver(model, load, materials.concrete.strength)
  const context: BranchContext = { solver, load, depth: model.axes.vTop - model.axes.vBottom }

  const startStrain = findStart(model, load, computeStartRange(document, model), solver)
  if (Number.isNaN(startStrain)) {
    const solution = assemble(document, model, [], [], { reason: 'no-equilibrium' }, solver.total)
    return { solution, folding: false }
  }
  const start = readState(solver, load, 0, startStrain)
  const watched = listWatchedStrains(document, model)
  const walk = walkBranch(context, model, watched, start, analysis.endAt)
  const onCurve = walk.reached.map((one) => one.state)
  const rows = layRows(context, walk.states, analysis.points, onCurve)
  const { states, reached } = addMomentStates(context, rows, walk.reached)
  const folding =
    walk.stop.reason === 'no-equilibrium' ||
    walk.states.some((state) => Math.abs(state.strainSlope) > foldingSlope * context.depth)
  return { solution: assemble(document, model, states, reached, walk.stop, solver.total), folding }
}

/** Strains between which the section at zero curvature is followed. */
function computeStartRange({ materials }: AnalysisDocument, model: SectionModel): StartRange {
  const limits = model.steels
    .filter((_, index) => findBarExtent(model, index) !== null)
    .map((steel) => steel.limitStrain)
  const given = limits.filter((limit) => limit !== null)
  const withoutLimit = limits.length === 0 ? 0 : leastStrainWithoutLimit
  const ultimates = model.spirals.map((spiral) => spiral.ultimateStrain)
  return {
    least: given.length > 0 ? -Math.min(...given) : withoutLimit,
    greatest: ultimates.length > 0 ? Math.min(...ultimates) : materials.concrete.spallingStrain,
  }
}

interface LocatedState {
  kind: LimitState['kind']
  item?: string
  state: BranchState
}

/** The greatest moment of the whole curve and the first drop by 20 %, located on the curve and added to the rows. */
function addMomentStates(
  context: BranchContext,
  rows: BranchState[],
  reached: readonly ReachedLimit[],
): { states: BranchState[]; reached: LocatedState[] } {
  const highest = rows.reduce((best, row, index) => (row.moment > rows[best].moment ? index : best), 0)
  const peak = locatePeak(context, rows, highest)
  const drop = findDrop(context, rows)
  const located: LocatedState[] = [
    ...reached.map(({ watched, state }) => ({ kind: watched.kind, item: watched.item, state })),
    { kind: 'peak-moment' as const, state: peak },
    ...(drop ? [{ kind: 'moment-drop-20' as const, state: drop }] : []),
  ]
  const states = insertRows(rows, drop ? [peak, drop] : [peak])
  return {
    states,
    // A state so near a row that it is no row of its own stands on that row. Sorting is stable: what is reached together stays
    // in the order of the document.
    reached: located
      .map((one) => ({ ...one, state: findRow(states, one.state) }))
      .sort((a, b) => a.state.kappa - b.state.kappa),
  }
}

function assemble(
  document: AnalysisDocument,
  model: SectionModel,
  states: readonly BranchState[],
  reached: readonly LocatedState[],
  stop: MomentCurvatureResult['stop'],
  iterations: number,
): MomentCurvatureSolution {
  const points = toPoints(model, states)
  const limitStates = reached.map(({ kind, item, state }): LimitState => ({
    kind,
    ...(item === undefined ? {} : { item }),
    curvature: state.kappa,
    moment: state.moment,
    axialStrain: state.eps0,
  }))
  const spirals = toSpiralResults(model)
  const zones = toZoneResults(model)
  const ultimateReached = states.length > 0 && stop.reason !== 'curvature-limit'
  const idealised = idealiseCurve(document.analysis.idealisation, points, limitStates, ultimateReached)
  return {
    warnings: listWarnings(document, model, { stop, limitStates }),
    spirals,
    zones,
    points,
    limitStates,
    idealised,
    stop,
    working: listWorking(document, model, idealised, limitStates),
    diagnostics: {
      fibers: model.fibers,
      iterations,
      worstResidual: states.reduce((worst, state) => Math.max(worst, state.residual), 0),
    },
  }
}

function toSpiralResults(model: SectionModel): SpiralResult[] {
  return model.spirals.map((state) => ({
    id: state.spiral.id,
    volumetricRatio: state.volumetricRatio,
    effectiveness: state.effectiveness,
    confiningStress: state.confiningStress,
    confinedStrength: state.confinedStrength,
    peakStrain: state.peakStrain,
    ultimateStrain: state.ultimateStrain,
    massPerLength: state.massPerLength,
  }))
}

function toZoneResults(model: SectionModel): ZoneResult[] {
  return model.zones.map((zone) => ({
    spirals: zone.spirals.map((index) => model.spirals[index].spiral.id),
    area: zone.total,
    confiningStress: zone.confiningStress,
    strength: zone.law.strength,
    peakStrain: zone.law.peakStrain,
  }))
}

function toPoints(model: SectionModel, states: readonly BranchState[]): CurvePoints {
  const { vTop } = model.axes
  const bars = findBarExtent(model)
  const strainAt = (v: number) => states.map(({ eps0, kappa }) => eps0 + kappa * v)
  const noBars = states.map(() => null)
  return {
    curvature: states.map((state) => state.kappa),
    moment: states.map((state) => state.moment),
    crossMoment: states.map((state) => computeCrossMoment(model, state.eps0, state.kappa)),
    axialStrain: states.map((state) => state.eps0),
    neutralAxisDepth: states.map(({ eps0, kappa }) => (kappa === 0 ? null : (eps0 + kappa * vTop) / kappa)),
    concreteStrain: strainAt(vTop),
    spiralStrain: Object.fromEntries(
      model.spirals.map((state, index) => [state.spiral.id, strainAt(model.spiralTops[index])]),
    ),
    barStrainTension: bars ? strainAt(bars.lowest) : noBars,
    barStrainCompression: bars ? strainAt(bars.highest) : noBars,
    residual: states.map((state) => state.residual),
    iterations: states.map((state) => state.iterations),
  }
}
