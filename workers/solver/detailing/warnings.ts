/** Everything a reader of the result must know about its validity, in the order: laws, spirals, bars, loads. */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { LimitState, MomentCurvatureResult, Warning } from '#shared/document/analysisResult.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import { warnOfBars } from './barWarnings.ts'
import { warnOfInterlock } from './interlockWarnings.ts'
import { mm, mpa } from './quantities.ts'

export interface Outcome {
  stop: MomentCurvatureResult['stop']
  limitStates: readonly LimitState[]
}

/** Range of concrete strengths that the law was fitted to, MPa. Mander, Priestley & Park 1988 (from memory). */
const manderStrengths = { least: 20, greatest: 60 }
/** Spiral yield strength up to which the spiral may be taken to yield at the peak, MPa. */
const greatestSpiralYield = 500
/** Clear spacing of spirals, mm. ACI 318-19 25.7.3.1 (from memory). */
const clearSpacing = { least: 25, greatest: 75 }
/** Uniform elongation above this is rather the elongation after fracture (common practice). */
const likelyElongation = 0.12

export function listWarnings(document: AnalysisDocument, model: SectionModel, outcome: Outcome): Warning[] {
  return [
    ...warnOfLaws(document),
    ...warnOfSpirals(document, model),
    ...warnOfInterlock(document, model),
    ...warnOfBars(document, model),
    ...warnOfLoads(document),
    ...warnOfOutcome(outcome),
  ]
}

function warnOfLaws({ section, materials }: AnalysisDocument): Warning[] {
  const warnings: Warning[] = []
  const { strength } = materials.concrete
  if (strength < manderStrengths.least || strength > manderStrengths.greatest) {
    warnings.push({
      code: 'concrete-out-of-range',
      path: 'materials.concrete.strength',
      message: `Concrete strength ${mpa(strength)} lies outside the range of the law, about ${manderStrengths.least} to ${mpa(manderStrengths.greatest)}.`,
      source: 'Mander, Priestley & Park 1988, range of the tests',
    })
  }
  const spiralSteels = new Set(section.spirals.map((spiral) => spiral.steel))
  for (const [name, steel] of Object.entries(materials.steels)) {
    const path = `materials.steels.${name}`
    if (spiralSteels.has(name) && steel.yieldStrength > greatestSpiralYield) {
      warnings.push({
        code: 'spiral-steel-out-of-range',
        path: `${path}.yieldStrength`,
        message: `Spiral steel ${name} of ${mpa(steel.yieldStrength)} may not yield when the concrete reaches its peak: above ${mpa(greatestSpiralYield)} the confined strength is likely overestimated.`,
        source: 'Légeron & Paultre 2003, J. Struct. Eng. 129(2), 241-252',
      })
    }
    const elongation = steel.strainAtMaximumStress
    if (elongation !== undefined && elongation > likelyElongation) {
      warnings.push({
        code: 'elongation-large',
        path: `${path}.strainAtMaximumStress`,
        message: `Strain at maximum stress ${elongation} of steel ${name} is large: it must be the uniform elongation, not the elongation after fracture.`,
        source: 'common practice',
      })
    }
  }
  return warnings
}

function warnOfSpirals({ section }: AnalysisDocument, model: SectionModel): Warning[] {
  const warnings: Warning[] = []
  model.spirals.forEach((state, index) => {
    const { id, pitch, barDiameter } = state.spiral
    const path = `section.spirals[${index}]`
    const clear = pitch - barDiameter
    if (clear < clearSpacing.least || clear > clearSpacing.greatest) {
      warnings.push({
        code: 'clear-spacing',
        path: `${path}.pitch`,
        message: `Clear spacing of spiral ${id} is ${mm(clear)}, the clause allows ${clearSpacing.least} to ${mm(clearSpacing.greatest)}.`,
        source: 'ACI 318-19 25.7.3.1',
      })
    }
    if (state.idleByVoid !== null) {
      warnings.push({
        code: 'void-idles-spiral',
        path,
        message: `Spiral ${id} confines nothing: less than a tenth of its diameter is left between it and the face of void ${state.idleByVoid + 1}, which has no lining.`,
        source: 'rule of this program, on the safe side',
      })
    }
  })
  if (section.spirals.length === 0) {
    warnings.push({
      code: 'unconfined',
      path: 'section.spirals',
      message:
        'There is no spiral: all concrete is unconfined and the curve ends by crushing, not by a spiral.',
      source: 'common practice',
    })
  }
  return warnings
}

function warnOfLoads({ section, cases, analysis }: AnalysisDocument): Warning[] {
  const round = section.outline.kind === 'circle' && section.spirals.length <= 1
  const directions = new Set(cases.map((one) => one.angle))
  if (round || directions.size > 1) return []
  return [
    {
      code: 'single-direction',
      path: 'analysis.angle',
      message: `The section is not round, and only the direction ${analysis.angle}° is analysed: another direction may govern.`,
      source: 'common practice',
    },
  ]
}

function warnOfOutcome({ stop }: Outcome): Warning[] {
  if (stop.reason === 'curvature-limit') {
    return [
      {
        code: 'no-limit-reached',
        path: 'analysis',
        message:
          'No limit state ended the curve: it was broken off at a curvature of 0.25 over the depth. Its end is not an ultimate state.',
      },
    ]
  }
  if (stop.reason === 'no-equilibrium') {
    return [
      {
        code: 'no-equilibrium',
        path: 'analysis.axialLoad',
        message:
          'Beyond the end of the curve the section cannot carry the axial load. Limit states that come later are not reached.',
      },
    ]
  }
  return []
}
