/** Labels beside points of a curve, each with a leader, clear of one another, of the curve and of the frame. Pixels. */

export interface LabelRequest {
  x: number
  y: number
  width: number
  height: number
}

export interface PlacedLabel {
  /** Left and top of the text's box. */
  left: number
  top: number
  /** End of the leader at the box. */
  anchorX: number
  anchorY: number
}

export interface Frame {
  left: number
  right: number
  top: number
  bottom: number
}

interface Box {
  left: number
  right: number
  top: number
  bottom: number
}

/** Where a label may stand, by the corner nearest to its point: below right first, where a curve leaves most room. */
const offsets: [dx: number, dy: number][] = []
for (const reach of [26, 46, 66, 90, 118, 150, 186, 226]) {
  for (const lean of [14, 34, 4, 60]) {
    offsets.push([lean, reach], [lean, -reach], [-lean, -reach], [-lean, reach])
  }
}
const padding = 3

/**
 * Places in the order asked; null for a label that finds no room. `curve` are points of the polyline, dense enough that
 * no label fits between two of them. The order of trial is fixed, so a label moves only when it must.
 */
export function placeLabels(
  labels: readonly LabelRequest[],
  curve: readonly { x: number; y: number }[],
  frame: Frame,
  taken: readonly Frame[] = [],
): (PlacedLabel | null)[] {
  const boxes: Box[] = [...taken]
  return labels.map(({ x, y, width, height }) => {
    for (const [dx, dy] of offsets) {
      const left = dx >= 0 ? x + dx : x + dx - width
      const top = dy >= 0 ? y + dy - height / 2 : y + dy - height / 2
      const box = { left, right: left + width, top, bottom: top + height }
      if (!isWithin(box, frame) || boxes.some((other) => overlaps(box, other))) continue
      if (curve.some((point) => holds(box, point))) continue
      if (labels.some((other) => holds(box, other))) continue
      boxes.push(box)
      return { left, top, anchorX: dx >= 0 ? left - 2 : left + width + 2, anchorY: top + height / 2 }
    }
    return null
  })
}

/** Vertical places (centres) for labels at the ends of curves, kept `height` apart and near to where they belong. */
export function placeEndLabels(
  ends: readonly number[],
  height: number,
  frame: { top: number; bottom: number },
): number[] {
  const order = ends.map((y, index) => ({ y, index })).sort((a, b) => a.y - b.y)
  const placed = order.map(({ y }) => y)
  for (let i = 1; i < placed.length; i++) placed[i] = Math.max(placed[i], placed[i - 1] + height)
  const over = (placed.at(-1) ?? 0) + height / 2 - frame.bottom
  if (over > 0) {
    for (let i = placed.length - 1; i >= 0; i--) {
      const most = i === placed.length - 1 ? frame.bottom - height / 2 : placed[i + 1] - height
      placed[i] = Math.min(placed[i], most)
    }
  }
  const result = new Array<number>(ends.length)
  order.forEach(({ index }, i) => (result[index] = placed[i]))
  return result
}

function isWithin(box: Box, frame: Frame): boolean {
  return (
    box.left >= frame.left && box.right <= frame.right && box.top >= frame.top && box.bottom <= frame.bottom
  )
}

function overlaps(a: Box, b: Box): boolean {
  return (
    a.left < b.right + padding &&
    b.left < a.right + padding &&
    a.top < b.bottom + padding &&
    b.top < a.bottom + padding
  )
}

function holds(box: Box, { x, y }: { x: number; y: number }): boolean {
  return (
    x > box.left - padding && x < box.right + padding && y > box.top - padding && y < box.bottom + padding
  )
}
