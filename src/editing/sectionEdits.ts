/**
 * Edits of a section by value: every function returns a new section and leaves the old one as it was.
 * Lengths in mm.
 */
import type { BarGroup, Point, Section, Spiral, Void } from '#shared/document/analysisDocument.ts'
import { computeDefaultBarArea } from '#shared/document/fillDefaults.ts'
import { computeOutlineBounds } from '#shared/geometry/outline.ts'
import { replaceSpirals } from '@/drawing/edits/ownRings.ts'

/** Changes the named spirals; their own rings of bars go with them and keep their distance to the wire. */
export function editSpirals(
  section: Section,
  ids: readonly string[],
  change: (spiral: Spiral) => Spiral,
): Section {
  const changed = section.spirals.filter(({ id }) => ids.includes(id))
  return replaceSpirals(section, new Map(changed.map((spiral) => [spiral.id, change(spiral)])))
}

function insideFace(spiral: Spiral): number {
  return spiral.diameter - spiral.barDiameter
}

/** A new spiral in the middle of the outline, made like the last one, within 50 mm cover. */
export function addSpiral(section: Section, steel: string): Section {
  const { centre, smallest } = measureOutline(section)
  const last = section.spirals.at(-1)
  const barDiameter = last?.barDiameter ?? 16
  const diameter = last ? Math.min(last.diameter, smallest - 100 - barDiameter) : smallest - 100 - barDiameter
  const spiral: Spiral = {
    id: freeName(
      section.spirals.map((one) => one.id),
      'S',
    ),
    centre,
    diameter: Math.max(round(diameter), 4 * barDiameter),
    barDiameter,
    barArea: last?.barArea ?? computeDefaultBarArea(barDiameter),
    pitch: last?.pitch ?? 80,
    form: last?.form ?? 'spiral',
    steel: last?.steel ?? steel,
  }
  return { ...section, spirals: [...section.spirals, spiral] }
}

export function removeSpirals(section: Section, ids: readonly string[]): Section {
  return { ...section, spirals: section.spirals.filter((spiral) => !ids.includes(spiral.id)) }
}

/** A ring of bars on the inside of the spiral that has none yet, else of the last spiral, else within 75 mm cover. */
export function addBarRing(section: Section, steel: string): Section {
  const barDiameter = section.bars.at(-1)?.barDiameter ?? 25
  const free = section.spirals.find((spiral) => !section.bars.some((group) => isConcentric(group, spiral)))
  const spiral = free ?? section.spirals.at(-1)
  const { centre, smallest } = measureOutline(section)
  const diameter = spiral ? insideFace(spiral) - barDiameter : smallest - 150 - barDiameter
  const group: BarGroup = {
    layout: {
      kind: 'ring',
      centre: spiral?.centre ?? centre,
      diameter: Math.max(round(diameter), 2 * barDiameter),
      count: diameter > 800 ? 16 : 8,
      startAngle: 90,
    },
    barDiameter,
    barArea: computeDefaultBarArea(barDiameter),
    steel,
  }
  return { ...section, bars: [...section.bars, group] }
}

/** A level line of four bars through the middle. */
export function addBarLine(section: Section, steel: string): Section {
  const { centre, smallest } = measureOutline(section)
  const barDiameter = section.bars.at(-1)?.barDiameter ?? 25
  const reach = round(smallest / 2 - 100)
  const group: BarGroup = {
    layout: {
      kind: 'line',
      from: [centre[0] - reach, centre[1]],
      to: [centre[0] + reach, centre[1]],
      count: 4,
    },
    barDiameter,
    barArea: computeDefaultBarArea(barDiameter),
    steel,
  }
  return { ...section, bars: [...section.bars, group] }
}

export function editBarGroup(
  section: Section,
  index: number,
  change: (group: BarGroup) => BarGroup,
): Section {
  return { ...section, bars: section.bars.map((group, i) => (i === index ? change(group) : group)) }
}

export function removeBarGroup(section: Section, index: number): Section {
  return { ...section, bars: section.bars.filter((_, i) => i !== index) }
}

/** A round void in the middle, a third of the outline wide. */
export function addVoid(section: Section): Section {
  const { centre, smallest } = measureOutline(section)
  const hole: Void = { kind: 'circle', centre, diameter: round(smallest / 3), lining: false }
  return { ...section, voids: [...section.voids, hole] }
}

export function editVoid(section: Section, index: number, change: (hole: Void) => Void): Section {
  return { ...section, voids: section.voids.map((hole, i) => (i === index ? change(hole) : hole)) }
}

export function removeVoid(section: Section, index: number): Section {
  return { ...section, voids: section.voids.filter((_, i) => i !== index) }
}

function isConcentric(group: BarGroup, spiral: Spiral): boolean {
  const { layout } = group
  return (
    layout.kind === 'ring' && layout.centre[0] === spiral.centre[0] && layout.centre[1] === spiral.centre[1]
  )
}

function measureOutline(section: Section): { centre: Point; smallest: number } {
  const { minX, maxX, minY, maxY } = computeOutlineBounds(section.outline)
  return {
    centre: [round((minX + maxX) / 2), round((minY + maxY) / 2)],
    smallest: Math.min(maxX - minX, maxY - minY),
  }
}

function freeName(taken: readonly string[], prefix: string): string {
  let number = 1
  while (taken.includes(`${prefix}${number}`)) number += 1
  return `${prefix}${number}`
}

/** To a tenth of a millimetre. */
function round(value: number): number {
  return Math.round(value * 10) / 10
}
