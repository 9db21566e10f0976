/**
 * What one spiral or hoop does to the concrete inside it. mm, mm2, MPa.
 *
 * Effectiveness and confining stress: Mander, Priestley & Park 1988, J. Struct. Eng. 114(8), 1804-1826. Ultimate strain:
 * M. J. N. Priestley, F. Seible, G. M. Calvi, "Seismic design and retrofit of bridges", Wiley 1996 (from memory).
 */

/** rhoS = 4 Asp / (ds s): volume of spiral over volume of the core inside its centreline. */
export function computeVolumetricRatio(barArea: number, ds: number, pitch: number): number {
  return (4 * barArea) / (ds * pitch)
}

/**
 * ke = (1 - s' / (2 ds))^n / (1 - rhoCc), n = 1 for a spiral and 2 for hoops, at most 1 and at least 0.
 * s' is the CLEAR pitch (mm), rhoCc the longitudinal steel inside over the core area.
 */
export function computeEffectiveness(
  form: 'spiral' | 'hoop',
  clearPitch: number,
  ds: number,
  rhoCc: number,
): number {
  const arch = Math.max(0, 1 - clearPitch / (2 * ds))
  const effective = form === 'spiral' ? arch : arch * arch
  return rhoCc < 1 ? Math.min(1, effective / (1 - rhoCc)) : 1
}

/** f'l = ke rhoS fyh / 2 (MPa). */
export function computeConfiningStress(ke: number, rhoS: number, fyh: number): number {
  return (ke * rhoS * fyh) / 2
}

/** epsCu = 0.004 + 1.4 rhoS fyh epsSu / fcc; epsSu is the spiral steel's strain at maximum stress. */
export function computeUltimateStrain(rhoS: number, fyh: number, epsSu: number, fcc: number): number {
  return 0.004 + (1.4 * rhoS * fyh * epsSu) / fcc
}

/** Density of steel, kg/mm3 (EN 1991-1-1 Table A.4, from memory: 7850 kg/m3). */
const steelDensity = 7850e-9

/** Mass of spiral per length of column, kg/mm: length of one turn (helix, or circumference of a hoop) over the pitch. */
export function computeMassPerLength(
  form: 'spiral' | 'hoop',
  barArea: number,
  ds: number,
  pitch: number,
): number {
  const circumference = Math.PI * ds
  const turn = form === 'spiral' ? Math.hypot(circumference, pitch) : circumference
  return (steelDensity * barArea * turn) / pitch
}
