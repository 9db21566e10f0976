/**
 * The only place where a number changes unit. Documents, solver, API and store keep N, mm, MPa, N·mm, 1/mm;
 * the screen, the printed sheet and exports show what is written here.
 */

export type QuantityKind =
  | 'length' // mm
  | 'area' // mm2
  | 'force' // N
  | 'moment' // N·mm
  | 'stress' // MPa
  | 'curvature' // 1/mm
  | 'massPerLength' // kg/mm
  | 'angle' // degrees
  | 'strain'
  | 'ratio'

interface ShownUnit {
  /** As printed behind the number; empty for pure numbers. */
  unit: string
  /** shown = stored * factor */
  factor: number
}

const si: Record<QuantityKind, ShownUnit> = {
  length: { unit: 'mm', factor: 1 },
  area: { unit: 'mm²', factor: 1 },
  force: { unit: 'kN', factor: 1e-3 },
  moment: { unit: 'kN·m', factor: 1e-6 },
  stress: { unit: 'MPa', factor: 1 },
  curvature: { unit: '1/m', factor: 1e3 },
  massPerLength: { unit: 'kg/m', factor: 1e3 },
  angle: { unit: '°', factor: 1 },
  strain: { unit: '', factor: 1 },
  ratio: { unit: '', factor: 1 },
}

export function unitOf(kind: QuantityKind): string {
  return si[kind].unit
}

export function toShown(kind: QuantityKind, stored: number): number {
  return stored * si[kind].factor
}

export function fromShown(kind: QuantityKind, shown: number): number {
  return shown / si[kind].factor
}
