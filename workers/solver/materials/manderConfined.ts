/**
 * Confined concrete after J. B. Mander, M. J. N. Priestley and R. Park, "Theoretical stress-strain model for confined
 * concrete", J. Struct. Eng. (ASCE) 114(8), 1804-1826, 1988 (equations from memory, re-derived for equal pressures).
 *
 * Stresses in MPa, strains dimensionless, compression positive. Fitted to fco of about 20 to 60 MPa.
 */

/** Stress over strain of one zone: peak strength, strain at the peak, and the exponent r = Ec / (Ec - Esec) > 1. */
export interface ManderCurve {
  fcc: number
  epsCc: number
  r: number
}

/**
 * Peak strength fcc (MPa) under equal lateral pressures fl (MPa, >= 0):
 * fcc = fco (-1.254 + 2.254 sqrt(1 + 7.94 fl / fco) - 2 fl / fco); never below fco, since the rounded constants
 * give 1 - 1e-16 without pressure.
 */
export function computeConfinedStrength(fco: number, fl: number): number {
  const ratio = fl / fco
  return fco * Math.max(1, -1.254 + 2.254 * Math.sqrt(1 + 7.94 * ratio) - 2 * ratio)
}

/** Strain at the peak: epsCc = epsCo (1 + 5 (fcc / fco - 1)). */
export function computeConfinedPeakStrain(epsCo: number, fco: number, fcc: number): number {
  return epsCo * (1 + 5 * (fcc / fco - 1))
}

/** The curve of concrete with modulus Ec (MPa) and a peak (fcc, epsCc); Ec must exceed fcc / epsCc. */
export function createManderCurve(fcc: number, epsCc: number, Ec: number): ManderCurve {
  const Esec = fcc / epsCc
  if (!(Ec > Esec)) throw new Error(`The modulus ${Ec} MPa must exceed the secant modulus ${Esec} MPa`)
  return { fcc, epsCc, r: Ec / (Ec - Esec) }
}

/** Beyond this power of x the curve has no stress left that could be told from zero. */
const vanishing = 1e100

/** Stress (MPa) at a strain: fcc x r / (r - 1 + x^r), x = eps / epsCc; zero in tension. */
export function computeManderStress(curve: ManderCurve, eps: number): number {
  if (eps <= 0) return 0
  const { fcc, epsCc, r } = curve
  const x = eps / epsCc
  const power = Math.pow(x, r)
  return power > vanishing ? 0 : (fcc * x * r) / (r - 1 + power)
}

/** Tangent modulus (MPa): fcc r (r - 1) (1 - x^r) / (epsCc (r - 1 + x^r)^2); zero in tension, Ec at the origin. */
export function computeManderTangent(curve: ManderCurve, eps: number): number {
  if (eps < 0) return 0
  const { fcc, epsCc, r } = curve
  const power = Math.pow(eps / epsCc, r)
  if (power > vanishing) return 0
  const denominator = r - 1 + power
  return (fcc * r * (r - 1) * (1 - power)) / (epsCc * denominator * denominator)
}
