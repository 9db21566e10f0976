import type { Section } from '#shared/document/analysisDocument.ts'

/** Parts of a section that document paths with an issue are about. */
export interface FaultyParts {
  outline: boolean
  spirals: Set<string>
  bars: Set<number>
  voids: Set<number>
}

export function findFaultyParts(section: Section, paths: readonly string[]): FaultyParts {
  const faulty: FaultyParts = { outline: false, spirals: new Set(), bars: new Set(), voids: new Set() }
  for (const path of paths) {
    const match = /^section\.(outline|spirals|bars|voids)(?:\[(\d+)\])?/.exec(path)
    if (!match) continue
    const index = match[2] === undefined ? -1 : Number(match[2])
    if (match[1] === 'outline') faulty.outline = true
    else if (match[1] === 'bars') faulty.bars.add(index)
    else if (match[1] === 'voids') faulty.voids.add(index)
    else if (section.spirals[index]) faulty.spirals.add(section.spirals[index].id)
  }
  return faulty
}
