/** Rows of the key to the hatching: zones with the same confining stress and make share one. */
import type { Section } from '#shared/document/analysisDocument.ts'
import type { SpiralResult, ZoneResult } from '#shared/document/analysisResult.ts'
import { nameSpirals } from './spiralNames.ts'

export interface HatchKeyRow {
  name: string
  /** MPa */
  confiningStress: number
  /** Spirals whose families are drawn in the sample. */
  spirals: string[]
}

/** Most rows for which there is room. */
export const mostKeyRows = 6

/**
 * Stress (MPa) of every spiral for its hatch family. Known from the spirals; a zone of one spiral alone tells the same.
 */
export function collectStresses(
  spirals: readonly SpiralResult[] | null,
  zones: readonly ZoneResult[] | null,
): Map<string, number> {
  const stresses = new Map<string, number>()
  for (const zone of zones ?? []) {
    if (zone.spirals.length === 1) stresses.set(zone.spirals[0], zone.confiningStress)
  }
  if (zones) for (const { id, confiningStress } of spirals ?? []) stresses.set(id, confiningStress)
  return stresses
}

/** Unconfined concrete first, then zones of one spiral, then overlaps, each by rising stress. */
export function listHatchKeyRows(section: Section, zones: readonly ZoneResult[] | null): HatchKeyRow[] {
  const known = new Set(section.spirals.map((spiral) => spiral.id))
  const rows = new Map<string, { zone: ZoneResult; ids: string[] }>()
  for (const zone of zones ?? []) {
    if (!zone.spirals.every((id) => known.has(id))) continue
    const key = `${zone.spirals.length}|${zone.confiningStress.toPrecision(6)}`
    const row = rows.get(key)
    if (row) row.ids.push(...zone.spirals)
    else rows.set(key, { zone, ids: [...zone.spirals] })
  }
  return [...rows.values()]
    .sort(
      (a, b) =>
        a.zone.spirals.length - b.zone.spirals.length || a.zone.confiningStress - b.zone.confiningStress,
    )
    .slice(0, mostKeyRows)
    .map(({ zone, ids }) => ({
      name: nameRow(zone, ids),
      confiningStress: zone.confiningStress,
      spirals: zone.spirals,
    }))
}

function nameRow(zone: ZoneResult, ids: readonly string[]): string {
  if (zone.spirals.length === 0) return 'cover'
  if (zone.spirals.length === 1) return nameSpirals(ids)
  return zone.spirals.length === 2 ? 'overlap' : `overlap of ${zone.spirals.length}`
}
