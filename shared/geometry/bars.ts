import type { BarGroup, BarLayout, Point } from '../document/analysisDocument.ts'

/** One longitudinal bar in its place. */
export interface PlacedBar {
  /** Index of the bar group in the section. */
  group: number
  /** Centre, mm. */
  x: number
  y: number
  /** mm */
  diameter: number
  /** mm2 */
  area: number
  steel: string
}

/** Centres (mm) of the bars of one layout, in document order; a ring runs counter-clockwise from its start angle. */
export function computeBarCentres(layout: BarLayout): Point[] {
  switch (layout.kind) {
    case 'ring': {
      const radius = layout.diameter / 2
      const [cx, cy] = layout.centre
      return Array.from({ length: layout.count }, (_, i): Point => {
        const angle = ((layout.startAngle + (360 * i) / layout.count) * Math.PI) / 180
        return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)]
      })
    }
    case 'line': {
      const { from, to, count } = layout
      if (count === 1) return [[(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]]
      return Array.from({ length: count }, (_, i): Point => {
        const t = i / (count - 1)
        return [from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1])]
      })
    }
    case 'points':
      return layout.points.map(([x, y]): Point => [x, y])
  }
}

/** All bars of all groups, in document order. */
export function placeBars(groups: readonly BarGroup[]): PlacedBar[] {
  return groups.flatMap((group, index) =>
    computeBarCentres(group.layout).map(([x, y]) => ({
      group: index,
      x,
      y,
      diameter: group.barDiameter,
      area: group.barArea,
      steel: group.steel,
    })),
  )
}
