/**
 * Area (mm2) that two circles share; radii and distance d of the centres in mm. Apart: 0; one inside the other: the
 * smaller circle. Closed form of the circular lens (two circular segments).
 */
export function computeLensArea(r1: number, r2: number, d: number): number {
  if (d >= r1 + r2) return 0
  const smaller = Math.min(r1, r2)
  if (d <= Math.abs(r1 - r2)) return Math.PI * smaller * smaller
  const half1 = Math.acos((d * d + r1 * r1 - r2 * r2) / (2 * d * r1))
  const half2 = Math.acos((d * d + r2 * r2 - r1 * r1) / (2 * d * r2))
  const kite = 0.5 * Math.sqrt((-d + r1 + r2) * (d + r1 - r2) * (d - r1 + r2) * (d + r1 + r2))
  return r1 * r1 * half1 + r2 * r2 * half2 - kite
}
