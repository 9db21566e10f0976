/** What lies under the pointer, by arithmetic in pixels of the drawing. */
import type { Section } from '#shared/document/analysisDocument.ts'
import { computeBarCentres } from '#shared/geometry/bars.ts'
import { computeBarRadius, computeWireWidth, listHandles, type Handle } from './grips.ts'
import type { Grip, Selection } from './selection.ts'
import type { Box } from './textBox.ts'
import type { ViewTransform } from './viewTransform.ts'

export interface Hit {
  grip: Grip
  cursor: Handle['cursor']
}

interface HitOptions {
  selection: Selection | null
  /** Full width (px) within which a handle is taken. */
  reach: number
  /** Names on the drawing: they take hold of their spiral. */
  names?: readonly { id: string; box: Box }[]
}

/**
 * Handles of what is selected come first, the nearest of them; then the centre of a spiral; then whichever of wires, bars
 * and rings is nearest, within a third of the reach; last the names.
 */
export function findHit(
  x: number,
  y: number,
  section: Section,
  view: ViewTransform,
  { selection, reach, names = [] }: HitOptions,
): Hit | null {
  const handle = findNearest(listHandles(section, view, selection), ({ x: hx, y: hy }) =>
    Math.max(Math.abs(hx - x), Math.abs(hy - y)),
  )
  if (handle && handle.far <= reach / 2) return handle.item

  const centre = findNearest(section.spirals, (spiral) =>
    Math.hypot(view.x(spiral.centre[0]) - x, view.y(spiral.centre[1]) - y),
  )
  if (centre && centre.far <= reach / 2) {
    return { grip: { kind: 'move-spiral', id: centre.item.id }, cursor: 'move' }
  }

  const part = findNearest([...listWires(section, view), ...listBars(section, view)], ({ measure }) =>
    measure(x, y),
  )
  if (part && part.far <= reach / 3) return part.item.hit

  const name = names.find(({ box }) => x >= box.left && x <= box.right && y >= box.top && y <= box.bottom)
  return name ? { grip: { kind: 'move-spiral', id: name.id }, cursor: 'move' } : null
}

interface Part {
  hit: Hit
  /** px from the part; 0 on it */
  measure(x: number, y: number): number
}

function listWires(section: Section, view: ViewTransform): Part[] {
  return section.spirals.map((spiral) => ({
    hit: { grip: { kind: 'move-spiral', id: spiral.id }, cursor: 'move' },
    measure: (x, y) => {
      const far = Math.hypot(view.x(spiral.centre[0]) - x, view.y(spiral.centre[1]) - y)
      const half = computeWireWidth(spiral.barDiameter, view) / 2
      return Math.max(0, Math.abs(far - (spiral.diameter / 2) * view.scale) - half)
    },
  }))
}

function listBars(section: Section, view: ViewTransform): Part[] {
  return section.bars.map((group, index) => {
    const radius = computeBarRadius(group.barDiameter, view)
    const centres = computeBarCentres(group.layout).map(([x, y]) => [view.x(x), view.y(y)])
    const ring = group.layout.kind === 'ring'
    return {
      hit: { grip: { kind: ring ? 'ring' : 'bars', group: index }, cursor: 'pointer' },
      measure: (x, y) =>
        Math.max(0, Math.min(...centres.map(([bx, by]) => Math.hypot(bx - x, by - y))) - radius),
    }
  })
}

function findNearest<T>(items: readonly T[], measure: (item: T) => number): { item: T; far: number } | null {
  let nearest: { item: T; far: number } | null = null
  for (const item of items) {
    const far = measure(item)
    if (!nearest || far < nearest.far) nearest = { item, far }
  }
  return nearest
}
