/**
 * Reinforcing steel with a yield plateau and power hardening: elastic, plateau at fy to epsSh, then
 * fu + (fy - fu) ((epsSu - eps) / (epsSu - epsSh))^p with p = Esh (epsSu - epsSh) / (fu - fy); zero past epsSu.
 * MPa; alike in tension and compression. Source: J. B. Mander 1984, thesis, University of Canterbury (from memory).
 */
export interface PlateauHardening {
  fy: number
  Es: number
  fu: number
  epsSh: number
  epsSu: number
  p: number
}

export function createPlateauHardening(
  fy: number,
  Es: number,
  fu: number,
  epsSh: number,
  Esh: number,
  epsSu: number,
): PlateauHardening {
  return { fy, Es, fu, epsSh, epsSu, p: (Esh * (epsSu - epsSh)) / (fu - fy) }
}

export function computePlateauHardeningStress(law: PlateauHardening, eps: number): number {
  const size = Math.abs(eps)
  const { fy, Es, fu, epsSh, epsSu, p } = law
  let stress = Es * size
  if (stress > fy) stress = fy
  if (size > epsSh) {
    stress = size > epsSu ? 0 : fu + (fy - fu) * Math.pow((epsSu - size) / (epsSu - epsSh), p)
  }
  return eps < 0 ? -stress : stress
}

export function computePlateauHardeningTangent(law: PlateauHardening, eps: number): number {
  const size = Math.abs(eps)
  const { fy, Es, fu, epsSh, epsSu, p } = law
  if (size > epsSu) return 0
  if (size > epsSh) {
    const left = (epsSu - size) / (epsSu - epsSh)
    // p < 1 has an infinite slope at the very end.
    return left > 0 ? ((fu - fy) * p * Math.pow(left, p - 1)) / (epsSu - epsSh) : 0
  }
  return Es * size < fy ? Es : 0
}
