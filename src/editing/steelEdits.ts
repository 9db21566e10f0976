/** Steels of a document by name: change the law, add, remove, rename; sections keep naming what exists. */
import type { AnalysisDocument, Steel } from '#shared/document/analysisDocument.ts'
import { computeDefaultLimitStrain } from '#shared/document/fillDefaults.ts'

export const steelLaws: { law: Steel['law']; name: string }[] = [
  { law: 'menegotto-pinto', name: 'Menegotto-Pinto' },
  { law: 'plateau-hardening', name: 'plateau and hardening' },
  { law: 'elastic-plastic', name: 'elastic-plastic' },
]

/** Parameters of the three laws where the earlier law had none: typical of grade 420 bar, common practice. */
const typical = {
  hardeningRatio: 0.01,
  r0: 20,
  a1: 18.5,
  a2: 0.15,
  a3: 0,
  a4: 7,
  hardeningStrain: 0.01,
  hardeningModulus: 5000,
  strainAtMaximumStress: 0.1,
  /** tensile over yield strength */
  overstrength: 1.35,
}

/** The same steel by another law; strengths, modulus and strains that both laws know stay. */
export function convertSteel(steel: Steel, law: Steel['law']): Steel {
  if (steel.law === law) return steel
  const { yieldStrength, modulus, specified, buckling, limitStrain, strainAtMaximumStress } = steel
  const common = { yieldStrength, modulus, buckling, ...(specified && { specified }) }
  const limits = {
    ...(strainAtMaximumStress !== undefined && { strainAtMaximumStress }),
    ...(limitStrain !== undefined && { limitStrain }),
  }
  switch (law) {
    case 'menegotto-pinto': {
      const { hardeningRatio, r0, a1, a2, a3, a4 } = typical
      return { law, ...common, ...limits, hardeningRatio, r0, a1, a2, a3, a4 }
    }
    case 'plateau-hardening': {
      const strain = strainAtMaximumStress ?? typical.strainAtMaximumStress
      return {
        law,
        ...common,
        tensileStrength: Math.round(yieldStrength * typical.overstrength),
        hardeningStrain: typical.hardeningStrain,
        hardeningModulus: typical.hardeningModulus,
        strainAtMaximumStress: strain,
        limitStrain: limitStrain ?? computeDefaultLimitStrain(strain),
      }
    }
    case 'elastic-plastic':
      return { law, ...common, ...limits }
  }
}

export function setSteel(document: AnalysisDocument, name: string, steel: Steel): AnalysisDocument {
  const steels = { ...document.materials.steels, [name]: steel }
  return { ...document, materials: { ...document.materials, steels } }
}

/** A copy of the last steel under a free name. */
export function addSteel(document: AnalysisDocument): AnalysisDocument {
  const names = Object.keys(document.materials.steels)
  const last = names.at(-1)
  if (last === undefined) return document
  let number = names.length + 1
  while (names.includes(`S${number}`)) number += 1
  return setSteel(document, `S${number}`, document.materials.steels[last])
}

/** True while a spiral or a bar group is made of it. */
export function isSteelUsed(document: AnalysisDocument, name: string): boolean {
  const { spirals, bars } = document.section
  return spirals.some((spiral) => spiral.steel === name) || bars.some((group) => group.steel === name)
}

export function removeSteel(document: AnalysisDocument, name: string): AnalysisDocument {
  const steels = Object.fromEntries(
    Object.entries(document.materials.steels).filter(([other]) => other !== name),
  )
  return { ...document, materials: { ...document.materials, steels } }
}

/** Renames a steel everywhere it is named; a name that is taken or empty changes nothing. */
export function renameSteel(document: AnalysisDocument, from: string, to: string): AnalysisDocument {
  if (to === '' || to in document.materials.steels) return document
  const steels = Object.fromEntries(
    Object.entries(document.materials.steels).map(([name, steel]) => [name === from ? to : name, steel]),
  )
  const follow = <T extends { steel: string }>(part: T): T =>
    part.steel === from ? { ...part, steel: to } : part
  return {
    ...document,
    section: {
      ...document.section,
      spirals: document.section.spirals.map(follow),
      bars: document.section.bars.map(follow),
    },
    materials: { ...document.materials, steels },
  }
}
