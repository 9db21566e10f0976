/**
 * The answer to a moment-curvature document. Units as in the document: N, mm, MPa, N·mm, 1/mm; compression positive.
 * Numbers that do not exist are null; there is no NaN and no Infinity.
 */
import type { AnalysisDocument } from './analysisDocument.ts'

export interface Warning {
  code: string
  /** Field the warning is about, as in issues. */
  path: string
  message: string
  /** Clause, paper or "common practice" behind the warning. */
  source?: string
}

export interface SpiralResult {
  id: string
  volumetricRatio: number
  effectiveness: number
  /** MPa */
  confiningStress: number
  /** MPa, from this spiral's confining stress alone */
  confinedStrength: number
  peakStrain: number
  ultimateStrain: number
  /** kg per mm of column */
  massPerLength: number
}

export interface ZoneResult {
  /** Ids of the spirals round this zone; [] for unconfined concrete. */
  spirals: string[]
  /** mm2, before bars are deducted */
  area: number
  confiningStress: number
  strength: number
  peakStrain: number
}

export interface CurvePoints {
  /** 1/mm */
  curvature: number[]
  /** N·mm */
  moment: number[]
  /** N·mm, about the other axis */
  crossMoment: number[]
  /** at the reference point */
  axialStrain: number[]
  /** mm from the most compressed point of the outline; null at zero curvature */
  neutralAxisDepth: (number | null)[]
  concreteStrain: number[]
  spiralStrain: Record<string, number[]>
  /** Most tensioned bar; null in a section without bars. */
  barStrainTension: (number | null)[]
  /** Most compressed bar; null in a section without bars. */
  barStrainCompression: (number | null)[]
  /** N */
  residual: number[]
  iterations: number[]
}

export const limitStateKinds = [
  'bar-yield-tension',
  'bar-0.015',
  'bar-rupture',
  'bar-yield-compression',
  'concrete-0.002',
  'concrete-0.003',
  'concrete-0.004',
  'spalling',
  'spiral-fracture',
  'void-face',
  'peak-moment',
  'moment-drop-20',
] as const
export type LimitStateKind = (typeof limitStateKinds)[number]

export interface LimitState {
  kind: LimitStateKind
  /** Steel name, spiral id or index of the void. */
  item?: string
  curvature: number
  moment: number
  axialStrain: number
}

export interface IdealisedCurve {
  rule: AnalysisDocument['analysis']['idealisation']
  firstYieldCurvature: number | null
  firstYieldMoment: number | null
  yieldCurvature: number | null
  yieldMoment: number | null
  ultimateCurvature: number | null
  ultimateMoment: number | null
  ductility: number | null
}

export type StopReason =
  | 'spiral-fracture'
  | 'bar-rupture'
  | 'void-face'
  | 'moment-drop-20'
  | 'moment-lost'
  | 'no-equilibrium'
  | 'curvature-limit'

export interface WorkingSymbol {
  name: string
  value: number
  unit: string
}

/** One derived number with the formula it came from and the numbers put in. */
export interface WorkingLine {
  /** `spiral:C:effectiveness` */
  id: string
  quantity: string
  formula: string
  symbols: WorkingSymbol[]
  value: number
  unit: string
  source: string
}

export interface Diagnostics {
  /** Concrete fibers (strip pieces) plus bars. */
  fibers: number
  iterations: number
  /** N */
  worstResidual: number
  milliseconds: number
}

export interface MomentCurvatureResult {
  format: 'girdwell-result/1'
  solver: { version: string }
  document: AnalysisDocument
  digest: string
  warnings: Warning[]
  spirals: SpiralResult[]
  zones: ZoneResult[]
  points: CurvePoints
  limitStates: LimitState[]
  idealised: IdealisedCurve
  stop: { reason: StopReason; item?: string }
  working: WorkingLine[]
  diagnostics: Diagnostics
}
