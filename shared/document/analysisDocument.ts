/**
 * The analysis document with every default filled in: what the solver reads, the store keeps and the sheet prints.
 *
 * Units: N, mm, MPa, N·mm, 1/mm; angles in degrees, in [0, 360). Compression is positive for load, stress and strain.
 * Axes: x right, y up; circle, rectangle and oblong are centred on (0, 0).
 */
import type { strengthBases } from './schema.ts'

/** [x, y], mm */
export type Point = [number, number]

export type Outline =
  | { kind: 'circle'; diameter: number }
  | { kind: 'rectangle'; width: number; depth: number; chamfer: number }
  | { kind: 'oblong'; width: number; depth: number }
  | { kind: 'polygon'; points: Point[] }

export interface Void {
  kind: 'circle'
  centre: Point
  diameter: number
  /** A steel lining carries the concrete of the void's face: the free-face rules do not hold. */
  lining: boolean
}

/** Diameter is to the centreline of the spiral bar. */
export interface Spiral {
  id: string
  centre: Point
  diameter: number
  barDiameter: number
  barArea: number
  pitch: number
  form: 'spiral' | 'hoop'
  steel: string
}

export type BarLayout =
  | { kind: 'ring'; centre: Point; diameter: number; count: number; startAngle: number }
  | { kind: 'line'; from: Point; to: Point; count: number }
  | { kind: 'points'; points: Point[] }

export interface BarGroup {
  layout: BarLayout
  barDiameter: number
  barArea: number
  steel: string
}

export interface Section {
  outline: Outline
  voids: Void[]
  spirals: Spiral[]
  bars: BarGroup[]
}

export type StrengthBasis = (typeof strengthBases)[number]

export interface Concrete {
  law: 'mander'
  /** Unconfined strength used in the analysis, f'co, MPa. */
  strength: number
  specified?: { strength: number }
  peakStrain: number
  spallingStrain: number
  modulus: number
  /** Unloading and reloading; moment-curvature is free of path and does not use it. */
  cyclic: 'karsan-jirsa' | 'mander'
  tension: { kind: 'none' }
}

interface SteelCommon {
  yieldStrength: number
  modulus: number
  specified?: { yieldStrength: number; tensileStrength?: number }
  /** Tensile strain that counts as rupture of a longitudinal bar; absent: no rupture limit. */
  limitStrain?: number
  buckling: { kind: 'none' }
}

export type Steel =
  | (SteelCommon & {
      law: 'menegotto-pinto'
      hardeningRatio: number
      tensileStrength?: number
      strainAtMaximumStress?: number
      r0: number
      a1: number
      a2: number
      a3: number
      a4: number
    })
  | (SteelCommon & {
      law: 'plateau-hardening'
      tensileStrength: number
      hardeningStrain: number
      hardeningModulus: number
      strainAtMaximumStress: number
    })
  | (SteelCommon & { law: 'elastic-plastic'; strainAtMaximumStress?: number })

export interface Confinement {
  strength: 'mander' | 'none'
  /** What a point inside several spirals gets: the sum of their confining stresses, or the largest. */
  overlap: 'sum' | 'largest'
  ultimateStrain: 'simplified'
}

export interface Materials {
  strengthBasis: StrengthBasis
  concrete: Concrete
  steels: Record<string, Steel>
  confinement: Confinement
}

export interface DesignCase {
  name: string
  axialLoad: number
  angle: number
  combination?: string
}

export interface MomentCurvatureAnalysis {
  kind: 'moment-curvature'
  /** N, at the centroid of the gross outline. Taken from the case where one is named. */
  axialLoad: number
  angle: number
  case?: string
  direction: 'curvature'
  points: number
  endAt: 'first-limit' | 'moment-drop-20'
  idealisation: 'first-yield-nominal' | 'equal-area-beyond-yield' | 'equal-area-from-zero'
}

export type Analysis = MomentCurvatureAnalysis

export interface AnalysisDocument {
  format: 'girdwell-analysis/1'
  title?: string
  notes?: Record<string, string>
  section: Section
  materials: Materials
  cases: DesignCase[]
  analysis: Analysis
}

/** What is wrong with a document: at which field, what was found there and what is allowed. */
export interface Issue {
  /** `section.spirals[0].pitch`; `(document)` for the whole. */
  path: string
  code: string
  /** What is wrong, in words, without the path. */
  message: string
  found?: string
  allowed?: string
}
