import type { AnalysisDocument, Issue } from './analysisDocument.ts'
import { listNames, quote } from './issueWords.ts'

/** Steels that spirals and bars name are defined, and those of spirals say how far they stretch. */
export function checkSteelNames({ section, materials }: AnalysisDocument): Issue[] {
  const { steels } = materials
  const known = Object.keys(steels)
  const check = (steel: string, path: string): Issue[] =>
    known.includes(steel)
      ? []
      : [
          {
            path,
            code: 'unknown-steel',
            message: 'names a steel that is not defined in materials.steels',
            found: quote(steel),
            allowed: listNames(known, 'nothing, since no steel is defined'),
          },
        ]
  const ofSpirals = new Set(section.spirals.map((spiral) => spiral.steel))
  return [
    ...section.spirals.flatMap((spiral, i) => check(spiral.steel, `section.spirals[${i}].steel`)),
    ...section.bars.flatMap((group, i) => check(group.steel, `section.bars[${i}].steel`)),
    ...known
      .filter((name) => ofSpirals.has(name) && steels[name].strainAtMaximumStress === undefined)
      .map((name) => ({
        path: `materials.steels.${name}.strainAtMaximumStress`,
        code: 'missing',
        message: 'is needed of a steel that spirals are made of',
        found: 'nothing',
        allowed: 'the uniform elongation, for example 0.09',
      })),
  ]
}
