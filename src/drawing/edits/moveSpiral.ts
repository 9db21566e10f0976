import type { Point, Section, Spiral } from '#shared/document/analysisDocument.ts'
import type { Partner } from '../mirrorPartners.ts'
import { replaceSpirals, toTenth } from './ownRings.ts'

/** Moves a spiral to a centre (mm) and its partners to the mirrored places; their rings of bars go with them. */
export function moveSpiral(
  section: Section,
  id: string,
  centre: Point,
  partners: readonly Partner[],
): Section {
  const targets = new Map<string, Point>([[id, centre]])
  for (const partner of partners) targets.set(partner.id, partner.map(centre))
  const changed = new Map<string, Spiral>()
  for (const spiral of section.spirals) {
    const target = targets.get(spiral.id)
    if (target) changed.set(spiral.id, { ...spiral, centre: [toTenth(target[0]), toTenth(target[1])] })
  }
  return replaceSpirals(section, changed)
}
