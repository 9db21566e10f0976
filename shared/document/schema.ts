/**
 * The analysis document as people, files and links hand it in: what may stand where.
 *
 * Units: N, mm, MPa, N·mm, 1/mm; angles in degrees. Compression is positive.
 * Optional fields are filled in by `fillDefaults`; rules that need more than one field stand in `checkDocument`.
 */
import '../noCodeFromText.ts'
import { z } from 'zod'

/** Bounds that only catch slips of unit or of the decimal point; engineering limits are warnings of the solver. */
export const bounds = {
  /** mm, outline and ring sizes */
  length: { min: 1, max: 100_000 },
  /** mm, positions */
  coordinate: { min: -100_000, max: 100_000 },
  /** mm */
  barDiameter: { min: 1, max: 200 },
  /** mm2 */
  barArea: { min: 0.5, max: 40_000 },
  /** mm */
  pitch: { min: 1, max: 10_000 },
  /** MPa, concrete */
  concreteStrength: { min: 1, max: 300 },
  /** MPa, steel */
  steelStrength: { min: 10, max: 3_000 },
  /** MPa */
  modulus: { min: 100, max: 1_000_000 },
  strain: { min: 1e-5, max: 1 },
  /** Menegotto-Pinto, slope after yield over modulus */
  hardeningRatio: { min: 0, max: 0.5 },
  /** of a group, and of the whole section */
  barCount: 2_000,
  spiralCount: 100,
  polygonPoints: 500,
} as const

const between = ({ min, max }: { min: number; max: number }) => z.number().min(min).max(max)

const length = between(bounds.length)
const coordinate = between(bounds.coordinate)
const point = z.tuple([coordinate, coordinate])
const barDiameter = between(bounds.barDiameter)
const barArea = between(bounds.barArea)
const strain = between(bounds.strain)
const angle = z.number().min(-36_000).max(36_000)
const name = z.string().trim().min(1).max(80)
/** Keys are not trimmed: two that differ by blanks only would become one. */
const key = z.string().regex(/^\S(.{0,78}\S)?$/su)

export const outlineSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('circle'), diameter: length }),
  z.strictObject({
    kind: z.literal('rectangle'),
    width: length,
    depth: length,
    chamfer: z.number().min(0).max(bounds.length.max).optional(),
  }),
  z.strictObject({ kind: z.literal('oblong'), width: length, depth: length }),
  z.strictObject({
    kind: z.literal('polygon'),
    points: z.array(point).min(3).max(bounds.polygonPoints),
  }),
])

export const voidSchema = z.strictObject({
  kind: z.literal('circle'),
  centre: point,
  diameter: length,
  lining: z.boolean().optional(),
})

export const spiralSchema = z.strictObject({
  id: name,
  centre: point,
  diameter: length,
  barDiameter,
  barArea: barArea.optional(),
  pitch: between(bounds.pitch),
  form: z.enum(['spiral', 'hoop']),
  steel: name,
})

export const barLayoutSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('ring'),
    centre: point,
    diameter: length,
    count: z.int().min(1).max(bounds.barCount),
    startAngle: angle.optional(),
  }),
  z.strictObject({
    kind: z.literal('line'),
    from: point,
    to: point,
    count: z.int().min(1).max(bounds.barCount),
  }),
  z.strictObject({ kind: z.literal('points'), points: z.array(point).min(1).max(bounds.barCount) }),
])

export const barGroupSchema = z.strictObject({
  layout: barLayoutSchema,
  barDiameter,
  barArea: barArea.optional(),
  steel: name,
})

export const sectionSchema = z.strictObject({
  outline: outlineSchema,
  voids: z.array(voidSchema).max(20).optional(),
  spirals: z.array(spiralSchema).max(bounds.spiralCount).optional(),
  bars: z.array(barGroupSchema).max(500).optional(),
})

export const concreteSchema = z.strictObject({
  law: z.enum(['mander']).optional(),
  strength: between(bounds.concreteStrength),
  specified: z.strictObject({ strength: between(bounds.concreteStrength) }).optional(),
  peakStrain: strain.optional(),
  spallingStrain: strain.optional(),
  modulus: between(bounds.modulus).optional(),
  cyclic: z.enum(['karsan-jirsa', 'mander']).optional(),
  tension: z.strictObject({ kind: z.literal('none') }).optional(),
})

const steelStrength = between(bounds.steelStrength)
const steelCommon = {
  yieldStrength: steelStrength,
  modulus: between(bounds.modulus).optional(),
  specified: z
    .strictObject({ yieldStrength: steelStrength, tensileStrength: steelStrength.optional() })
    .optional(),
  limitStrain: strain.optional(),
  buckling: z.strictObject({ kind: z.literal('none') }).optional(),
}

export const steelSchema = z.discriminatedUnion('law', [
  z.strictObject({
    law: z.literal('menegotto-pinto'),
    ...steelCommon,
    hardeningRatio: between(bounds.hardeningRatio).optional(),
    tensileStrength: steelStrength.optional(),
    strainAtMaximumStress: strain.optional(),
    r0: z.number().min(1).max(200).optional(),
    a1: z.number().min(0).max(200).optional(),
    a2: z.number().min(1e-6).max(100).optional(),
    a3: z.number().min(0).max(10).optional(),
    a4: z.number().min(0).max(100).optional(),
  }),
  z.strictObject({
    law: z.literal('plateau-hardening'),
    ...steelCommon,
    tensileStrength: steelStrength,
    hardeningStrain: strain,
    hardeningModulus: between(bounds.modulus),
    strainAtMaximumStress: strain,
  }),
  z.strictObject({
    law: z.literal('elastic-plastic'),
    ...steelCommon,
    strainAtMaximumStress: strain.optional(),
  }),
])

export const confinementSchema = z.strictObject({
  strength: z.enum(['mander', 'none']).optional(),
  overlap: z.enum(['sum', 'largest']).optional(),
  ultimateStrain: z.enum(['simplified']).optional(),
})

export const strengthBases = ['expected', 'specified', 'measured', 'design'] as const

export const materialsSchema = z.strictObject({
  strengthBasis: z.enum(strengthBases).optional(),
  concrete: concreteSchema,
  steels: z.record(key, steelSchema),
  confinement: confinementSchema.optional(),
})

export const caseSchema = z.strictObject({
  name,
  axialLoad: z.number(),
  angle: angle.optional(),
  combination: z.string().max(200).optional(),
})

export const momentCurvatureSchema = z.strictObject({
  kind: z.literal('moment-curvature'),
  axialLoad: z.number().optional(),
  angle: angle.optional(),
  case: name.optional(),
  direction: z.enum(['curvature']).optional(),
  points: z.int().min(100).max(2000).optional(),
  endAt: z.enum(['first-limit', 'moment-drop-20']).optional(),
  idealisation: z.enum(['first-yield-nominal', 'equal-area-beyond-yield', 'equal-area-from-zero']).optional(),
})

export const analysisSchema = z.discriminatedUnion('kind', [momentCurvatureSchema])

export const documentSchema = z.strictObject({
  format: z.literal('girdwell-analysis/1'),
  title: z.string().max(200).optional(),
  notes: z.record(z.string().max(80), z.string().max(4000)).optional(),
  section: sectionSchema,
  materials: materialsSchema,
  cases: z.array(caseSchema).max(500).optional(),
  analysis: analysisSchema,
})

/** A document as handed in: sound in shape, defaults not yet filled. */
export type AnalysisDocumentInput = z.infer<typeof documentSchema>
