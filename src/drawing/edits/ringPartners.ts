import type { BarGroup, Section } from '#shared/document/analysisDocument.ts'
import { findMirrorPartners } from '../mirrorPartners.ts'
import { findOwner, findOwnRings } from './ownRings.ts'

/** A ring of bars that is kept alike with another one. */
export interface RingPartner {
  group: number
  /** -1: its spiral is a mirror image, so it turns the other way. */
  sense: 1 | -1
}

/** Rings of the same make in the partners of the spiral that a ring belongs to. */
export function findRingPartners(section: Section, group: number): RingPartner[] {
  const owner = findOwner(section, group)
  if (!owner) return []
  const ring = section.bars[group]
  return findMirrorPartners(section.spirals, owner.id).flatMap(({ id, sense }) => {
    const spiral = section.spirals.find((one) => one.id === id)
    const match = spiral && findOwnRings(section, spiral).find((index) => isAlike(section.bars[index], ring))
    return match === undefined ? [] : [{ group: match, sense }]
  })
}

function isAlike(a: BarGroup, b: BarGroup): boolean {
  return (
    a.layout.kind === 'ring' &&
    b.layout.kind === 'ring' &&
    a.layout.diameter === b.layout.diameter &&
    a.layout.count === b.layout.count &&
    a.barDiameter === b.barDiameter &&
    a.steel === b.steel
  )
}
