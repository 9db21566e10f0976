import Papa from 'papaparse'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { toShown } from '#shared/units.ts'
import { nameStop } from './limitStateNames.ts'

/** What a pitch is judged by. Stored units; null where there is no such number. */
export interface PitchRow {
  /** mm */
  pitch: number
  /** The section as it stands has this pitch. */
  inForce: boolean
  /** Why there is no curve. */
  problem: string | null
  /** Least over the spirals, MPa, and whose it is. */
  confinedStrength: number | null
  confinedStrengthOf: string | null
  ultimateCurvature: number | null
  governing: string | null
  ductility: number | null
  greatestMoment: number | null
  /** All spirals together, kg/mm. */
  spiralMass: number | null
}

export function toPitchRow(
  pitch: number,
  inForce: boolean,
  result: MomentCurvatureResult | null,
  problem: string | null,
): PitchRow {
  const least = result?.spirals.reduce<MomentCurvatureResult['spirals'][number] | null>(
    (low, spiral) => (low === null || spiral.confinedStrength < low.confinedStrength ? spiral : low),
    null,
  )
  const peak = result?.limitStates.find((state) => state.kind === 'peak-moment')
  return {
    pitch,
    inForce,
    problem,
    confinedStrength: least?.confinedStrength ?? null,
    confinedStrengthOf: least?.id ?? null,
    ultimateCurvature: result?.idealised.ultimateCurvature ?? null,
    governing: result && result.points.curvature.length > 0 ? nameStop(result) : null,
    ductility: result?.idealised.ductility ?? null,
    greatestMoment: peak?.moment ?? null,
    spiralMass: result ? result.spirals.reduce((sum, spiral) => sum + spiral.massPerLength, 0) : null,
  }
}

export function writePitchCsv(title: string, rows: readonly PitchRow[]): string {
  const shown = (value: number | null, convert: (stored: number) => number) =>
    value === null ? '' : Number(convert(value).toPrecision(6))
  const table = rows.map((row) => [
    row.pitch,
    shown(row.confinedStrength, (value) => toShown('stress', value)),
    row.confinedStrengthOf ?? '',
    shown(row.ultimateCurvature, (value) => toShown('curvature', value)),
    shown(row.ductility, (value) => value),
    shown(row.greatestMoment, (value) => toShown('moment', value)),
    shown(row.spiralMass, (value) => toShown('massPerLength', value)),
    row.governing ?? row.problem ?? '',
  ])
  const head = [
    'pitch, mm',
    'least confined strength, MPa',
    'of spiral',
    'ultimate curvature, 1/m',
    'ductility',
    'greatest moment, kN·m',
    'spiral mass, kg/m',
    'governed by',
  ]
  return Papa.unparse([[title], [], head, ...table], { escapeFormulae: true })
}
