/** Which rings of bars belong to a spiral, and how they go with it. mm. */
import type { BarGroup, Point, Section, Spiral } from '#shared/document/analysisDocument.ts'

/** How near (mm) two centres must be to count as one. */
const near = 0.05

/**
 * Indices of the rings of bars that belong to a spiral: concentric with it and inside its wire, with no smaller spiral
 * of the same centre between.
 */
export function findOwnRings(section: Section, spiral: Spiral): number[] {
  const inner = section.spirals.filter(
    (other) =>
      other.id !== spiral.id && other.diameter < spiral.diameter && isSamePlace(other.centre, spiral.centre),
  )
  return section.bars.flatMap((group, index) => {
    const { layout } = group
    if (layout.kind !== 'ring' || !isSamePlace(layout.centre, spiral.centre)) return []
    const own = isInside(group, spiral) && !inner.some((other) => isInside(group, other))
    return own ? [index] : []
  })
}

/** The spiral that a ring of bars belongs to. */
export function findOwner(section: Section, group: number): Spiral | undefined {
  return section.spirals.find((spiral) => findOwnRings(section, spiral).includes(group))
}

/** Puts changed spirals in their places; their own rings move with the centre and keep their distance to the wire. */
export function replaceSpirals(section: Section, changed: ReadonlyMap<string, Spiral>): Section {
  const bars = [...section.bars]
  for (const before of section.spirals) {
    const after = changed.get(before.id)
    if (!after) continue
    const growth = after.diameter - after.barDiameter - (before.diameter - before.barDiameter)
    for (const index of findOwnRings(section, before)) bars[index] = carry(bars[index], after.centre, growth)
  }
  return {
    ...section,
    bars,
    spirals: section.spirals.map((spiral) => changed.get(spiral.id) ?? spiral),
  }
}

function carry(group: BarGroup, centre: Point, growth: number): BarGroup {
  if (group.layout.kind !== 'ring') return group
  const diameter = Math.max(group.barDiameter, toTenth(group.layout.diameter + growth))
  return { ...group, layout: { ...group.layout, centre, diameter } }
}

function isInside(group: BarGroup, spiral: Spiral): boolean {
  return group.layout.kind === 'ring' && group.layout.diameter < spiral.diameter
}

function isSamePlace(a: Point, b: Point): boolean {
  return Math.abs(a[0] - b[0]) <= near && Math.abs(a[1] - b[1]) <= near
}

/** To 0.1 mm, the finest step of an edit by hand. */
export function toTenth(value: number): number {
  return Math.round(value * 10) / 10 + 0
}
