/**
 * Unconfined concrete: the curve of Mander, Priestley & Park 1988 up to twice the strain at peak, then a straight line
 * to zero at the spalling strain (J. Struct. Eng. 114(8), 1804-1826; from memory). MPa, compression positive.
 */
import {
  computeManderStress,
  computeManderTangent,
  createManderCurve,
  type ManderCurve,
} from './manderConfined.ts'

export interface UnconfinedCurve {
  curve: ManderCurve
  /** 2 epsCo: the straight line begins. */
  epsLine: number
  /** The stress (MPa) there. */
  stressLine: number
  epsSp: number
  /** Slope (MPa, negative) of the straight line. */
  slopeLine: number
}

/** From fco, epsCo, Ec and the spalling strain epsSp > 2 epsCo. */
export function createUnconfinedCurve(
  fco: number,
  epsCo: number,
  Ec: number,
  epsSp: number,
): UnconfinedCurve {
  const curve = createManderCurve(fco, epsCo, Ec)
  const epsLine = 2 * epsCo
  const stressLine = computeManderStress(curve, epsLine)
  return { curve, epsLine, stressLine, epsSp, slopeLine: -stressLine / (epsSp - epsLine) }
}

export function computeUnconfinedStress(law: UnconfinedCurve, eps: number): number {
  if (eps <= law.epsLine) return computeManderStress(law.curve, eps)
  return eps < law.epsSp ? law.stressLine + law.slopeLine * (eps - law.epsLine) : 0
}

export function computeUnconfinedTangent(law: UnconfinedCurve, eps: number): number {
  if (eps <= law.epsLine) return computeManderTangent(law.curve, eps)
  return eps < law.epsSp ? law.slopeLine : 0
}
