/**
 * First loading of reinforcing steel after M. Menegotto and P. E. Pinto 1973 with the parameters of F. C. Filippou,
 * E. P. Popov and V. V. Bertero 1983 (from memory): sigma = fy (b e + (1 - b) e / (1 + |e|^R0)^(1 / R0)), e = eps Es / fy.
 * MPa; alike in tension and compression; no rupture in the law.
 */
export function computeMenegottoPintoStress(
  fy: number,
  Es: number,
  b: number,
  R0: number,
  eps: number,
): number {
  const e = (eps * Es) / fy
  const power = Math.pow(Math.abs(e), R0)
  // From here on 1 + power is power, and its root |e|.
  const root = power > 1e17 ? Math.abs(e) : Math.pow(1 + power, 1 / R0)
  return fy * (b * e + ((1 - b) * e) / root)
}

/** d sigma / d eps = Es (b + (1 - b) / ((1 + |e|^R0)^(1/R0) (1 + |e|^R0))), MPa. */
export function computeMenegottoPintoTangent(
  fy: number,
  Es: number,
  b: number,
  R0: number,
  eps: number,
): number {
  const power = Math.pow(Math.abs((eps * Es) / fy), R0)
  return power > 1e17 ? Es * b : Es * (b + (1 - b) / (Math.pow(1 + power, 1 / R0) * (1 + power)))
}
