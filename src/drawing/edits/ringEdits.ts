/** Edits of rings of bars by hand; other layouts are left as they are. mm and degrees. */
import type { BarGroup, Section } from '#shared/document/analysisDocument.ts'
import { editBarGroup } from '@/editing/sectionEdits.ts'

export function resizeRing(section: Section, group: number, diameter: number): Section {
  return editBarGroup(section, group, (bars) =>
    bars.layout.kind === 'ring'
      ? { ...bars, layout: { ...bars.layout, diameter: Math.max(diameter, 2 * bars.barDiameter) } }
      : bars,
  )
}

/** Turns a ring so that its first bar stands at the angle. */
export function turnRing(section: Section, group: number, startAngle: number): Section {
  const angle = Math.round((((startAngle % 360) + 360) % 360) * 2) / 2
  return editBarGroup(section, group, (bars) =>
    bars.layout.kind === 'ring' ? { ...bars, layout: { ...bars.layout, startAngle: angle % 360 } } : bars,
  )
}

/** Moves a whole group. */
export function moveBars(section: Section, group: number, dx: number, dy: number): Section {
  return editBarGroup(section, group, (bars) => shift(bars, dx, dy))
}

function shift(bars: BarGroup, dx: number, dy: number): BarGroup {
  const { layout } = bars
  const by = ([x, y]: readonly [number, number]): [number, number] => [x + dx, y + dy]
  switch (layout.kind) {
    case 'ring':
      return { ...bars, layout: { ...layout, centre: by(layout.centre) } }
    case 'line':
      return { ...bars, layout: { ...layout, from: by(layout.from), to: by(layout.to) } }
    case 'points':
      return { ...bars, layout: { ...layout, points: layout.points.map(by) } }
  }
}
