import type { BarLayout, Point, Section } from '#shared/document/analysisDocument.ts'
import { toTenth } from './ownRings.ts'

/** Moves a whole group of bars by (dx, dy), mm. */
export function moveBars(section: Section, group: number, dx: number, dy: number): Section {
  return {
    ...section,
    bars: section.bars.map((bars, index) =>
      index === group ? { ...bars, layout: shift(bars.layout, dx, dy) } : bars,
    ),
  }
}

function shift(layout: BarLayout, dx: number, dy: number): BarLayout {
  const by = ([x, y]: Point): Point => [toTenth(x + dx), toTenth(y + dy)]
  switch (layout.kind) {
    case 'ring':
      return { ...layout, centre: by(layout.centre) }
    case 'line':
      return { ...layout, from: by(layout.from), to: by(layout.to) }
    case 'points':
      return { ...layout, points: layout.points.map(by) }
  }
}
