import type { Section } from '#shared/document/analysisDocument.ts'
import type { RingPartner } from './ringPartners.ts'

/** Turns a ring of bars by an angle (degrees, counter-clockwise); mirrored partners turn the other way. */
export function turnRing(
  section: Section,
  group: number,
  by: number,
  partners: readonly RingPartner[],
): Section {
  const senses = new Map<number, 1 | -1>([[group, 1]])
  for (const partner of partners) senses.set(partner.group, partner.sense)
  return {
    ...section,
    bars: section.bars.map((bars, index) => {
      const sense = senses.get(index)
      return bars.layout.kind === 'ring' && sense !== undefined
        ? { ...bars, layout: { ...bars.layout, startAngle: toTurn(bars.layout.startAngle + sense * by) } }
        : bars
    }),
  }
}

/** To a tenth of a degree in [0, 360). */
function toTurn(degrees: number): number {
  const tenths = Math.round(degrees * 10) % 3600
  return (tenths < 0 ? tenths + 3600 : tenths + 0) / 10
}
