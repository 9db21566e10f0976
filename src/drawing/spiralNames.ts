/** "C", "W, E", "K1–K4": names of several spirals in one word. */
export function nameSpirals(ids: readonly string[]): string {
  return ids.length < 3 ? ids.join(', ') : `${ids[0]}–${ids[ids.length - 1]}`
}
