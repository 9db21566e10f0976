/** Rules of materials and cases that need more than one field. */
import type { AnalysisDocument, Issue, Steel } from './analysisDocument.ts'

/** Uniform elongation above this is rather the elongation after fracture; common practice. */
const likelyUniformElongation = 0.12

export function checkMaterials({ section, materials, cases }: AnalysisDocument): Issue[] {
  const issues: Issue[] = []
  const { strength, peakStrain, spallingStrain, modulus } = materials.concrete
  if (spallingStrain <= 2 * peakStrain) {
    issues.push({
      path: 'materials.concrete.spallingStrain',
      code: 'spalling-strain',
      message: 'must exceed twice the strain at peak stress',
      found: String(spallingStrain),
      allowed: `more than ${2 * peakStrain}`,
    })
  }
  if (modulus <= strength / peakStrain) {
    issues.push({
      path: 'materials.concrete.modulus',
      code: 'modulus',
      message: 'must exceed strength over strain at peak, or the curve cannot rise to its peak',
      found: `${modulus} MPa`,
      allowed: `more than ${Number((strength / peakStrain).toPrecision(6))} MPa`,
    })
  }
  for (const [name, steel] of Object.entries(materials.steels)) {
    issues.push(...checkSteel(`materials.steels.${name}`, steel))
  }
  const used = new Set(section.spirals.map((spiral) => spiral.steel))
  for (const name of used) {
    const steel = materials.steels[name]
    if (steel && steel.strainAtMaximumStress === undefined) {
      issues.push({
        path: `materials.steels.${name}.strainAtMaximumStress`,
        code: 'missing',
        message: 'is needed of a steel that spirals are made of',
        found: 'nothing',
        allowed: 'the uniform elongation, for example 0.09',
      })
    }
  }
  issues.push(
    ...checkNames(
      cases.map((one) => one.name),
      (index) => `cases[${index}].name`,
    ),
  )
  return issues
}

function checkSteel(path: string, steel: Steel): Issue[] {
  const issues: Issue[] = []
  const yieldStrain = steel.yieldStrength / steel.modulus
  const exceedsYield = (field: 'limitStrain' | 'strainAtMaximumStress') => {
    const strain = steel[field]
    if (strain === undefined || strain > yieldStrain) return
    issues.push({
      path: `${path}.${field}`,
      code: 'strain-order',
      message: 'must exceed the yield strain',
      found: String(strain),
      allowed: `more than ${Number(yieldStrain.toPrecision(4))}`,
    })
  }
  exceedsYield('limitStrain')
  exceedsYield('strainAtMaximumStress')
  if (steel.law === 'menegotto-pinto') {
    if (!Number.isFinite(steel.hardeningRatio)) {
      issues.push({
        path: `${path}.hardeningRatio`,
        code: 'missing',
        message: 'is needed, or else tensileStrength and strainAtMaximumStress',
        found: 'nothing',
        allowed: 'a number from 0 to 0.5',
      })
    } else if (steel.hardeningRatio < 0 || steel.hardeningRatio > 0.5) {
      issues.push({
        path: `${path}.tensileStrength`,
        code: 'hardening-ratio',
        message: 'gives a hardening ratio out of range',
        found: `ratio ${Number(steel.hardeningRatio.toPrecision(4))}`,
        allowed: '0 to 0.5',
      })
    }
    if (steel.a1 >= steel.r0) {
      issues.push({
        path: `${path}.a1`,
        code: 'strain-order',
        message: 'must be below r0, or the curvature of the branch vanishes',
        found: String(steel.a1),
        allowed: `less than ${steel.r0}`,
      })
    }
  }
  if (steel.law === 'plateau-hardening') {
    const { tensileStrength, yieldStrength, hardeningStrain, strainAtMaximumStress } = steel
    if (tensileStrength <= yieldStrength) {
      issues.push({
        path: `${path}.tensileStrength`,
        code: 'strength-order',
        message: 'must exceed the yield strength',
        found: `${tensileStrength} MPa`,
        allowed: `more than ${yieldStrength} MPa`,
      })
    }
    if (hardeningStrain < yieldStrain) {
      issues.push({
        path: `${path}.hardeningStrain`,
        code: 'strain-order',
        message: 'must not be below the yield strain',
        found: String(hardeningStrain),
        allowed: `at least ${Number(yieldStrain.toPrecision(4))}`,
      })
    }
    if (hardeningStrain >= strainAtMaximumStress) {
      issues.push({
        path: `${path}.hardeningStrain`,
        code: 'strain-order',
        message: 'must be below the strain at maximum stress',
        found: String(hardeningStrain),
        allowed: `less than ${strainAtMaximumStress}`,
      })
    }
  }
  return issues
}

/** True where the strain at maximum stress looks like the elongation after fracture: the field asks, nothing is refused. */
export function looksLikeFractureElongation(strainAtMaximumStress: number): boolean {
  return strainAtMaximumStress > likelyUniformElongation
}

/** Names that stand twice. */
export function checkNames(names: readonly string[], pathOf: (index: number) => string): Issue[] {
  return names.flatMap((name, index) => {
    const first = names.indexOf(name)
    if (first === index) return []
    return [
      {
        path: pathOf(index),
        code: 'duplicate',
        message: `stands twice, first at ${pathOf(first)}`,
        found: JSON.stringify(name),
        allowed: 'a name of its own',
      },
    ]
  })
}
