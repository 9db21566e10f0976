/** Rules of concrete and steels that need more than one field. Stresses in MPa. */
import type { AnalysisDocument, Concrete, Issue, Steel } from './analysisDocument.ts'
import { mpa, strain } from './issueWords.ts'
import { bounds } from './schema.ts'

export function checkMaterials({ materials }: AnalysisDocument): Issue[] {
  return [
    ...checkConcrete(materials.concrete),
    ...Object.entries(materials.steels).flatMap(([name, steel]) =>
      checkSteel(`materials.steels.${name}`, steel),
    ),
  ]
}

function checkConcrete({ strength, peakStrain, spallingStrain, modulus }: Concrete): Issue[] {
  const issues: Issue[] = []
  if (spallingStrain <= 2 * peakStrain) {
    issues.push({
      path: 'materials.concrete.spallingStrain',
      code: 'spalling-strain',
      message: 'must exceed twice the strain at peak stress',
      found: strain(spallingStrain),
      allowed: `more than ${strain(2 * peakStrain)}`,
    })
  }
  if (modulus <= strength / peakStrain) {
    issues.push({
      path: 'materials.concrete.modulus',
      code: 'modulus',
      message: 'must exceed strength over strain at peak stress, or the curve cannot rise to its peak',
      found: mpa(modulus),
      allowed: `more than ${mpa(strength / peakStrain)}`,
    })
  }
  return issues
}

function checkSteel(path: string, steel: Steel): Issue[] {
  const yieldStrain = steel.yieldStrength / steel.modulus
  const issues: Issue[] = []
  for (const field of ['limitStrain', 'strainAtMaximumStress'] as const) {
    const found = steel[field]
    if (found === undefined || found > yieldStrain) continue
    issues.push({
      path: `${path}.${field}`,
      code: 'strain-order',
      message: 'must exceed the yield strain',
      found: strain(found),
      allowed: `more than ${strain(yieldStrain)}`,
    })
  }
  switch (steel.law) {
    case 'menegotto-pinto':
      return [...issues, ...checkMenegottoPinto(path, steel)]
    case 'plateau-hardening':
      return [...issues, ...checkPlateauHardening(path, steel, yieldStrain)]
    case 'elastic-plastic':
      return issues
  }
}

function checkMenegottoPinto(path: string, steel: Extract<Steel, { law: 'menegotto-pinto' }>): Issue[] {
  const { hardeningRatio, tensileStrength, strainAtMaximumStress, a1, r0 } = steel
  const issues: Issue[] = []
  const { max } = bounds.hardeningRatio
  if (Number.isNaN(hardeningRatio)) {
    const given = [
      tensileStrength !== undefined && 'tensileStrength only',
      strainAtMaximumStress !== undefined && 'strainAtMaximumStress only',
    ].find(Boolean)
    issues.push({
      path: `${path}.hardeningRatio`,
      code: 'missing',
      message: 'is needed, or else both tensileStrength and strainAtMaximumStress',
      found: given || 'nothing',
      allowed: `a number from 0 to ${max}`,
    })
  } else if (hardeningRatio < 0 || hardeningRatio > max) {
    // Given outright, the ratio was in range: this one derives from the tensile strength.
    issues.push({
      path: `${path}.tensileStrength`,
      code: 'hardening-ratio',
      message: 'gives a hardening ratio out of range',
      found: `ratio ${strain(hardeningRatio)}`,
      allowed: `a ratio from 0 to ${max}`,
    })
  }
  if (a1 >= r0) {
    issues.push({
      path: `${path}.a1`,
      code: 'branch-shape',
      message: 'must be below r0, or the branch loses its shape',
      found: String(a1),
      allowed: `less than ${r0}`,
    })
  }
  return issues
}

function checkPlateauHardening(
  path: string,
  steel: Extract<Steel, { law: 'plateau-hardening' }>,
  yieldStrain: number,
): Issue[] {
  const { tensileStrength, yieldStrength, hardeningStrain, strainAtMaximumStress } = steel
  const issues: Issue[] = []
  if (tensileStrength <= yieldStrength) {
    issues.push({
      path: `${path}.tensileStrength`,
      code: 'strength-order',
      message: 'must exceed the yield strength',
      found: mpa(tensileStrength),
      allowed: `more than ${mpa(yieldStrength)}`,
    })
  }
  if (hardeningStrain < yieldStrain) {
    issues.push({
      path: `${path}.hardeningStrain`,
      code: 'strain-order',
      message: 'must not be below the yield strain',
      found: strain(hardeningStrain),
      allowed: `at least ${strain(yieldStrain)}`,
    })
  }
  if (hardeningStrain >= strainAtMaximumStress) {
    issues.push({
      path: `${path}.hardeningStrain`,
      code: 'strain-order',
      message: 'must be below the strain at maximum stress',
      found: strain(hardeningStrain),
      allowed: `less than ${strain(strainAtMaximumStress)}`,
    })
  }
  return issues
}
