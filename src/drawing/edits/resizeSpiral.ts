import type { Section, Spiral } from '#shared/document/analysisDocument.ts'
import type { Partner } from '../mirrorPartners.ts'
import { replaceSpirals, toTenth } from './ownRings.ts'

/**
 * Gives a spiral and its partners a centreline diameter (mm), at least four of its bars; their rings of bars keep their
 * distance to the wire.
 */
export function resizeSpiral(
  section: Section,
  id: string,
  diameter: number,
  partners: readonly Partner[],
): Section {
  const ids = new Set([id, ...partners.map((partner) => partner.id)])
  const changed = new Map<string, Spiral>()
  for (const spiral of section.spirals) {
    if (!ids.has(spiral.id)) continue
    changed.set(spiral.id, { ...spiral, diameter: Math.max(toTenth(diameter), 4 * spiral.barDiameter) })
  }
  return replaceSpirals(section, changed)
}
