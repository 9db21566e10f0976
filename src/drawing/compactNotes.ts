/** On a narrow drawing all sizes stand beside the section, with leaders. */
import type { Section } from '#shared/document/analysisDocument.ts'
import { computeBarCentres } from '#shared/geometry/bars.ts'
import { groupAlikeBars } from '@/editing/barGroups.ts'
import { groupAlike } from '@/editing/spiralGroups.ts'
import type { Target } from './callouts.ts'
import { computeBarRadius, computeWireWidth } from './grips.ts'
import { measureLines, type NoteRequest } from './noteLines.ts'
import { formatSize } from './size.ts'
import type { ViewTransform } from './viewTransform.ts'

const mostNotes = 5

/** From the highest to the lowest part, so that leaders run side by side. */
export function listCompactNotes(section: Section, view: ViewTransform): NoteRequest[] {
  return [...listSpiralNotes(section, view), ...listBarNotes(section, view), ...listVoidNotes(section, view)]
    .slice(0, mostNotes)
    .sort((a, b) => findHighest(a) - findHighest(b))
}

function listSpiralNotes(section: Section, view: ViewTransform): NoteRequest[] {
  return groupAlike(section.spirals).map(({ name, members }) => {
    const [spiral] = members
    const lines = [
      { strong: `${name}, ${members.length} no.`, text: '' },
      {
        strong: '',
        text: `Ø${formatSize(spiral.diameter)}, ${formatSize(spiral.barDiameter)} at ${formatSize(spiral.pitch)}`,
      },
    ]
    const targets = members.map(({ centre, diameter, barDiameter }): Target => ({
      kind: 'edge',
      x: view.x(centre[0]),
      y: view.y(centre[1]),
      radius: (diameter / 2) * view.scale + computeWireWidth(barDiameter, view) / 2,
    }))
    return { key: `group-${name}`, lines, ...measureLines(lines), targets: keepRightmost(targets) }
  })
}

/** 24 × 32; 4 × 8 × 29 where several groups are alike. */
function listBarNotes(section: Section, view: ViewTransform): NoteRequest[] {
  const rows = groupAlikeBars(section.bars, true)
  if (rows.length === 0) return []
  const lines = rows.slice(0, 3).map(({ members, group, count }) => {
    const times = members.length === 1 ? '' : `${members.length} × `
    return { strong: `${times}${count / members.length} × ${formatSize(group.barDiameter)}`, text: '' }
  })
  const targets = rows[0].members.flatMap((index) =>
    computeBarCentres(section.bars[index].layout).map(([x, y]): Target => ({
      kind: 'edge',
      x: view.x(x),
      y: view.y(y),
      radius: computeBarRadius(section.bars[index].barDiameter, view) + 1,
    })),
  )
  return [{ key: 'bars', lines, ...measureLines(lines), targets: keepRightmost(targets) }]
}

function listVoidNotes(section: Section, view: ViewTransform): NoteRequest[] {
  return section.voids.map((hole, i) => {
    const lines = [{ strong: hole.lining ? 'lined void' : 'void', text: `Ø${formatSize(hole.diameter)}` }]
    const target: Target = {
      kind: 'edge',
      x: view.x(hole.centre[0]),
      y: view.y(hole.centre[1]),
      radius: (hole.diameter / 2) * view.scale,
    }
    return { key: `void-${i}`, lines, ...measureLines(lines), targets: [target] }
  })
}

/** Those whose leaders need not cross the section. */
function keepRightmost(targets: readonly Target[]): Target[] {
  const rightmost = Math.max(...targets.map(({ x }) => x))
  const leftmost = Math.min(...targets.map(({ x }) => x))
  return targets.filter(({ x }) => x >= rightmost - 0.3 * (rightmost - leftmost) - 1)
}

function findHighest({ targets }: NoteRequest): number {
  return Math.min(...targets.map((target) => target.y - (target.kind === 'edge' ? target.radius : 0)))
}
