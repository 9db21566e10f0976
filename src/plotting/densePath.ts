/** A polyline with points no farther apart than `step` pixels. */
export function densePath(
  points: readonly { x: number; y: number }[],
  step: number,
): { x: number; y: number }[] {
  const dense: { x: number; y: number }[] = []
  points.forEach((point, i) => {
    const before = points[i - 1]
    if (before) {
      const pieces = Math.ceil(Math.hypot(point.x - before.x, point.y - before.y) / step)
      for (let k = 1; k < pieces; k++) {
        const t = k / pieces
        dense.push({ x: before.x + t * (point.x - before.x), y: before.y + t * (point.y - before.y) })
      }
    }
    dense.push(point)
  })
  return dense
}
