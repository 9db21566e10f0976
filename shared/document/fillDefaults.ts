/**
 * Every default of the analysis document, filled in so that a stored document and a printed sheet show every value used.
 * Derived defaults are rounded to nine significant digits, and the solver uses the rounded value.
 */
import type {
  AnalysisDocument,
  BarGroup,
  BarLayout,
  Concrete,
  DesignCase,
  Outline,
  Point,
  Spiral,
  Steel,
  Void,
} from './analysisDocument.ts'
import type { AnalysisDocumentInput } from './schema.ts'

type SectionInput = AnalysisDocumentInput['section']
type MaterialsInput = AnalysisDocumentInput['materials']
type SteelInput = MaterialsInput['steels'][string]

/** Steel modulus, MPa; common practice. */
const steelModulus = 200_000
/** Strain at peak stress of unconfined concrete; Mander, Priestley & Park 1988 (from memory). */
const peakStrain = 0.002
/** Strain at which the cover has lost its stress; US bridge practice (from memory). */
const spallingStrain = 0.005
/** Menegotto & Pinto 1973 with Filippou, Popov & Bertero 1983 (from memory). */
const menegottoPinto = { r0: 20, a1: 18.5, a2: 0.15, a3: 0, a4: 7 }

/** Area (mm2) of a round bar of diameter d (mm): pi d^2 / 4, to nine significant digits. */
export function computeDefaultBarArea(diameter: number): number {
  return roundDerived((Math.PI * diameter * diameter) / 4)
}

/** Modulus (MPa) of concrete of strength f'co (MPa): 5000 sqrt(f'co), Mander, Priestley & Park 1988 (from memory). */
export function computeDefaultModulus(strength: number): number {
  return roundDerived(5000 * Math.sqrt(strength))
}

/** Tensile strain that counts as rupture of a bar: 0.75 of the strain at maximum stress. */
export function computeDefaultLimitStrain(strainAtMaximumStress: number): number {
  return roundDerived(0.75 * strainAtMaximumStress)
}

/**
 * Hardening ratio b of a Menegotto-Pinto steel whose asymptote meets tensile strength fu (MPa) at its strain epsU:
 * (fu - fy) / (epsU - fy / Es) / Es.
 */
export function computeHardeningRatio(fy: number, fu: number, epsU: number, Es: number): number {
  return roundDerived((fu - fy) / (epsU - fy / Es) / Es)
}

/** Nine significant digits. */
export function roundDerived(value: number): number {
  return Number(value.toPrecision(9))
}

/** A document sound in shape, with every default filled in, -0 as 0 and angles in [0, 360). */
export function fillDefaults(input: AnalysisDocumentInput): AnalysisDocument {
  const cases = (input.cases ?? []).map((one): DesignCase => ({
    name: one.name,
    axialLoad: plain(one.axialLoad),
    angle: toPlainAngle(one.angle ?? 0),
    ...optional('combination', one.combination),
  }))
  const { analysis } = input
  const named = cases.find((one) => one.name === analysis.case)
  return {
    format: input.format,
    ...optional('title', input.title),
    ...optional('notes', input.notes),
    section: fillSection(input.section),
    materials: {
      strengthBasis: input.materials.strengthBasis ?? 'expected',
      concrete: fillConcrete(input.materials.concrete),
      steels: Object.fromEntries(
        Object.entries(input.materials.steels).map(([name, steel]) => [name, fillSteel(steel)]),
      ),
      confinement: {
        strength: input.materials.confinement?.strength ?? 'mander',
        overlap: input.materials.confinement?.overlap ?? 'sum',
        ultimateStrain: input.materials.confinement?.ultimateStrain ?? 'simplified',
      },
    },
    cases,
    analysis: {
      kind: analysis.kind,
      axialLoad: plain(named?.axialLoad ?? analysis.axialLoad ?? 0),
      angle: named?.angle ?? toPlainAngle(analysis.angle ?? 0),
      ...optional('case', analysis.case),
      direction: analysis.direction ?? 'curvature',
      points: analysis.points ?? 200,
      endAt: analysis.endAt ?? 'first-limit',
      idealisation: analysis.idealisation ?? 'first-yield-nominal',
    },
  }
}

function fillSection(section: SectionInput): AnalysisDocument['section'] {
  return {
    outline: fillOutline(section.outline),
    voids: (section.voids ?? []).map((hole): Void => ({
      kind: hole.kind,
      centre: fillPoint(hole.centre),
      diameter: hole.diameter,
      lining: hole.lining ?? false,
    })),
    spirals: (section.spirals ?? []).map((spiral): Spiral => ({
      id: spiral.id,
      centre: fillPoint(spiral.centre),
      diameter: spiral.diameter,
      barDiameter: spiral.barDiameter,
      barArea: spiral.barArea ?? computeDefaultBarArea(spiral.barDiameter),
      pitch: spiral.pitch,
      form: spiral.form,
      steel: spiral.steel,
    })),
    bars: (section.bars ?? []).map((group): BarGroup => ({
      layout: fillLayout(group.layout),
      barDiameter: group.barDiameter,
      barArea: group.barArea ?? computeDefaultBarArea(group.barDiameter),
      steel: group.steel,
    })),
  }
}

function fillOutline(outline: SectionInput['outline']): Outline {
  switch (outline.kind) {
    case 'rectangle':
      return { ...outline, chamfer: plain(outline.chamfer ?? 0) }
    case 'polygon':
      return { ...outline, points: outline.points.map(fillPoint) }
    default:
      return outline
  }
}

function fillLayout(layout: NonNullable<SectionInput['bars']>[number]['layout']): BarLayout {
  switch (layout.kind) {
    case 'ring':
      return {
        kind: layout.kind,
        centre: fillPoint(layout.centre),
        diameter: layout.diameter,
        count: layout.count,
        startAngle: toPlainAngle(layout.startAngle ?? 90),
      }
    case 'line':
      return {
        kind: layout.kind,
        from: fillPoint(layout.from),
        to: fillPoint(layout.to),
        count: layout.count,
      }
    case 'points':
      return { kind: layout.kind, points: layout.points.map(fillPoint) }
  }
}

function fillConcrete(concrete: MaterialsInput['concrete']): Concrete {
  return {
    law: concrete.law ?? 'mander',
    strength: concrete.strength,
    ...optional('specified', concrete.specified),
    peakStrain: concrete.peakStrain ?? peakStrain,
    spallingStrain: concrete.spallingStrain ?? spallingStrain,
    modulus: concrete.modulus ?? computeDefaultModulus(concrete.strength),
    cyclic: concrete.cyclic ?? 'karsan-jirsa',
    tension: concrete.tension ?? { kind: 'none' },
  }
}

function fillSteel(steel: SteelInput): Steel {
  const modulus = steel.modulus ?? steelModulus
  const limitStrain =
    steel.limitStrain ??
    (steel.strainAtMaximumStress === undefined
      ? undefined
      : computeDefaultLimitStrain(steel.strainAtMaximumStress))
  const common = {
    yieldStrength: steel.yieldStrength,
    modulus,
    ...optional('specified', steel.specified),
    ...optional('limitStrain', limitStrain),
    buckling: steel.buckling ?? { kind: 'none' as const },
  }
  switch (steel.law) {
    case 'menegotto-pinto':
      return {
        law: steel.law,
        ...common,
        hardeningRatio: plain(steel.hardeningRatio ?? deriveHardeningRatio(steel, modulus)),
        ...optional('tensileStrength', steel.tensileStrength),
        ...optional('strainAtMaximumStress', steel.strainAtMaximumStress),
        r0: steel.r0 ?? menegottoPinto.r0,
        a1: plain(steel.a1 ?? menegottoPinto.a1),
        a2: steel.a2 ?? menegottoPinto.a2,
        a3: plain(steel.a3 ?? menegottoPinto.a3),
        a4: plain(steel.a4 ?? menegottoPinto.a4),
      }
    case 'plateau-hardening':
      return {
        law: steel.law,
        ...common,
        tensileStrength: steel.tensileStrength,
        hardeningStrain: steel.hardeningStrain,
        hardeningModulus: steel.hardeningModulus,
        strainAtMaximumStress: steel.strainAtMaximumStress,
      }
    case 'elastic-plastic':
      return { law: steel.law, ...common, ...optional('strainAtMaximumStress', steel.strainAtMaximumStress) }
  }
}

/** NaN where the law lacks what the ratio derives from: the checks make an issue of that. */
function deriveHardeningRatio(
  steel: Extract<SteelInput, { law: 'menegotto-pinto' }>,
  modulus: number,
): number {
  const { yieldStrength, tensileStrength, strainAtMaximumStress } = steel
  if (tensileStrength === undefined || strainAtMaximumStress === undefined) return Number.NaN
  return computeHardeningRatio(yieldStrength, tensileStrength, strainAtMaximumStress, modulus)
}

/** The same direction in [0, 360) degrees; an angle that lies there already keeps its digits. */
export function toPlainAngle(angle: number): number {
  const turned = angle % 360
  const positive = turned < 0 ? turned + 360 : turned
  return positive === 360 ? 0 : plain(positive)
}

function fillPoint([x, y]: Point): Point {
  return [plain(x), plain(y)]
}

/** -0 as 0, so that equal documents have equal text. */
function plain(value: number): number {
  return value === 0 ? 0 : value
}

/** A field that stays absent when it is not given. */
function optional<K extends string, V>(name: K, value: V | undefined): { [P in K]?: V } {
  return value === undefined ? {} : ({ [name]: value } as { [P in K]?: V })
}
