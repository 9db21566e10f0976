/**
 * Values that the reader derived from others follow when the others are edited; values somebody typed stay.
 * A value counts as derived while it equals the default of the number it is derived from.
 */
import type { Concrete, Steel } from '#shared/document/analysisDocument.ts'
import {
  computeDefaultBarArea,
  computeDefaultLimitStrain,
  computeDefaultModulus,
} from '#shared/document/fillDefaults.ts'

/** The concrete with another strength (MPa); the modulus follows if it was the default. */
export function withConcreteStrength(concrete: Concrete, strength: number): Concrete {
  const derived = concrete.modulus === computeDefaultModulus(concrete.strength)
  return { ...concrete, strength, modulus: derived ? computeDefaultModulus(strength) : concrete.modulus }
}

/** The steel with another strain at maximum stress; the limit strain follows if it was the default. */
export function withStrainAtMaximumStress(steel: Steel, strain: number): Steel {
  const before = steel.strainAtMaximumStress
  const derived = before === undefined || steel.limitStrain === computeDefaultLimitStrain(before)
  return {
    ...steel,
    strainAtMaximumStress: strain,
    limitStrain: derived ? computeDefaultLimitStrain(strain) : steel.limitStrain,
  }
}

/** Bar or wire with another diameter (mm) and the area of that circle. */
export function withBarDiameter<T extends { barDiameter: number; barArea: number }>(
  bar: T,
  diameter: number,
): T {
  return { ...bar, barDiameter: diameter, barArea: computeDefaultBarArea(diameter) }
}
