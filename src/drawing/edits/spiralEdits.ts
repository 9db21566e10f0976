/** Edits of spirals by hand: each returns a new section and leaves the one it started from as it was. mm. */
import type { Point, Section } from '#shared/document/analysisDocument.ts'
import { editSpirals } from '@/editing/sectionEdits.ts'
import type { Partner } from '../mirrorPartners.ts'

/** Moves a spiral, and its partners to the mirrored places; concentric rings of bars go with them. */
export function moveSpiral(
  section: Section,
  id: string,
  centre: Point,
  partners: readonly Partner[],
): Section {
  let moved = editSpirals(section, [id], (spiral) => ({ ...spiral, centre }))
  for (const partner of partners) {
    const [x, y] = partner.map(centre)
    // A mirror image of 0 may be -0.
    moved = editSpirals(moved, [partner.id], (spiral) => ({ ...spiral, centre: [x + 0, y + 0] }))
  }
  return moved
}

/** Gives a spiral and its partners another centreline diameter; rings inside keep their distance to the wire. */
export function resizeSpiral(
  section: Section,
  id: string,
  diameter: number,
  partners: readonly Partner[],
): Section {
  return editSpirals(section, [id, ...partners.map((partner) => partner.id)], (spiral) => ({
    ...spiral,
    diameter: Math.max(diameter, 2 * spiral.barDiameter),
  }))
}
