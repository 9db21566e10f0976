import type { Section } from '#shared/document/analysisDocument.ts'
import { toTenth } from './ownRings.ts'
import type { RingPartner } from './ringPartners.ts'

/** Gives a ring of bars and its partners a diameter (mm) through the bar centres, at least two bars wide. */
export function resizeRing(
  section: Section,
  group: number,
  diameter: number,
  partners: readonly RingPartner[],
): Section {
  const groups = new Set([group, ...partners.map((partner) => partner.group)])
  return {
    ...section,
    bars: section.bars.map((bars, index) =>
      bars.layout.kind === 'ring' && groups.has(index)
        ? {
            ...bars,
            layout: { ...bars.layout, diameter: Math.max(toTenth(diameter), 2 * bars.barDiameter) },
          }
        : bars,
    ),
  }
}
