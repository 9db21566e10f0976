/** What is written beside a selected part, and spoken about it. */
import type { BarGroup, Section, Spiral } from '#shared/document/analysisDocument.ts'
import { computeBarCentres } from '#shared/geometry/bars.ts'
import { findRingPartners } from './edits/ringPartners.ts'
import { findOwner } from './edits/ownRings.ts'
import { findMirrorPartners } from './mirrorPartners.ts'
import type { Selection } from './selection.ts'
import { formatSize } from './size.ts'
import { nameSpirals } from './spiralNames.ts'

export interface PartWords {
  name: string
  size: string
  /** Spirals or rings that go with it, as words; empty: none. */
  alike: string
}

/** Ø1384, 16 bar at 80 */
export function writeSpiralSize(spiral: Spiral): string {
  return `Ø${formatSize(spiral.diameter)}, ${formatSize(spiral.barDiameter)} ${spiral.form === 'hoop' ? 'hoop' : 'bar'} at ${formatSize(spiral.pitch)}`
}

export function writePart(section: Section, selection: Selection): PartWords | null {
  if (selection.kind === 'spiral') {
    const spiral = section.spirals.find((one) => one.id === selection.id)
    if (!spiral) return null
    const partners = findMirrorPartners(section.spirals, spiral.id).map(({ id }) => id)
    return {
      name: spiral.id,
      size: writeSpiralSize(spiral),
      alike: partners.length === 0 ? '' : nameSpirals(inOrder(section, [spiral.id, ...partners])),
    }
  }
  const group = section.bars[selection.group]
  if (!group) return null
  const owner = findOwner(section, selection.group)
  const partners = findRingPartners(section, selection.group)
  const owners = partners.flatMap((partner) => findOwner(section, partner.group)?.id ?? [])
  return {
    name: `${computeBarCentres(group.layout).length} × ${formatSize(group.barDiameter)}`,
    size: writeLayout(group),
    alike:
      !owner || owners.length === 0 ? '' : `bars of ${nameSpirals(inOrder(section, [owner.id, ...owners]))}`,
  }
}

/** The same in full words, with the place: for those who listen. */
export function speakPart(section: Section, selection: Selection, reason: string): string {
  const words = writePart(section, selection)
  if (!words) return ''
  const parts: string[] = []
  if (selection.kind === 'spiral') {
    const spiral = section.spirals.find((one) => one.id === selection.id)
    if (spiral) {
      const [x, y] = spiral.centre
      parts.push(
        `Spiral ${spiral.id}, diameter ${formatSize(spiral.diameter)}, bar ${formatSize(spiral.barDiameter)}, pitch ${formatSize(spiral.pitch)}`,
        `centre ${formatSize(x)}, ${formatSize(y)}`,
      )
    }
  } else {
    parts.push(`Bars ${words.name} ${words.size}`)
  }
  if (reason !== '') parts.push(reason)
  if (words.alike !== '') parts.push(`${words.alike} kept alike`)
  return `${parts.join(', ')}.`
}

function writeLayout({ layout }: BarGroup): string {
  switch (layout.kind) {
    case 'ring':
      return `on Ø${formatSize(layout.diameter)}, first at ${formatSize(layout.startAngle)}°`
    case 'line':
      return 'in a line'
    case 'points':
      return 'by places'
  }
}

function inOrder(section: Section, ids: readonly string[]): string[] {
  return section.spirals.flatMap(({ id }) => (ids.includes(id) ? [id] : []))
}
