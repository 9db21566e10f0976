import type { Spiral } from '#shared/document/analysisDocument.ts'

/** Spirals that differ in nothing but place and name: edited together, shown on one row. */
export interface SpiralGroup {
  /** "K1–K4", "C" */
  name: string
  members: Spiral[]
}

export function groupAlike(spirals: readonly Spiral[]): SpiralGroup[] {
  const groups = new Map<string, Spiral[]>()
  for (const spiral of spirals) {
    const key = [
      spiral.diameter,
      spiral.barDiameter,
      spiral.barArea,
      spiral.pitch,
      spiral.form,
      spiral.steel,
    ].join('|')
    groups.set(key, [...(groups.get(key) ?? []), spiral])
  }
  return [...groups.values()].map((members) => ({ name: nameMembers(members), members }))
}

function nameMembers(members: readonly Spiral[]): string {
  const ids = members.map((spiral) => spiral.id)
  return ids.length < 3 ? ids.join(', ') : `${ids[0]}–${ids[ids.length - 1]}`
}
