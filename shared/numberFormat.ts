/**
 * How numbers are written, on the screen, in print and in sentences: three to four significant figures,
 * thousands apart by a narrow no-break space (U+202F), always with the unit.
 */
import { toShown, unitOf, type QuantityKind } from './units.ts'

const narrowSpace = '\u202F'
/** Written where there is no number: state not reached, not defined. */
export const noNumber = '–'

const superscripts: Record<string, string> = Object.fromEntries(
  [...'-0123456789'].map((sign, i) => [sign, [...'⁻⁰¹²³⁴⁵⁶⁷⁸⁹'][i]]),
)

/** `digits` significant figures; thousands grouped from 10 000 on by default; a power of ten below 0.0001. */
export function formatNumber(value: number | null | undefined, digits = 4): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return noNumber
  if (value === 0) return '0'
  const magnitude = Math.floor(Math.log10(Math.abs(Number(value.toPrecision(digits)))))
  if (magnitude < -4 || magnitude > 14) return writePower(value, digits)
  const decimals = Math.max(0, digits - 1 - magnitude)
  const [whole, fraction] = Math.abs(value).toFixed(decimals).split('.')
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, narrowSpace) : whole
  const sign = value < 0 ? '\u2212' : ''
  return sign + grouped + (fraction === undefined ? '' : `.${fraction}`)
}

/** "2.6 × 10⁻¹²" */
function writePower(value: number, digits: number): string {
  const [mantissa, exponent] = value.toExponential(digits - 1).split('e')
  const raised = exponent.replace('+', '').replace(/[-\d]/g, (sign) => superscripts[sign])
  return `${mantissa.replace('-', '\u2212')}${narrowSpace}×${narrowSpace}10${raised}`
}

/** A number as it was given: up to `most` significant figures and no zeros that say nothing. */
export function formatGiven(value: number | null | undefined, most = 6): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return noNumber
  const plain = Number(value.toPrecision(most))
  if (plain === 0) return '0'
  const needed = plain.toExponential().split('e')[0].replace(/[-.]/g, '').length
  const whole = Math.floor(Math.log10(Math.abs(plain))) + 1
  return formatNumber(plain, Math.max(needed, whole, 1))
}

/** An input in the unit shown for its kind, as it was given, with the unit. */
export function formatInput(kind: QuantityKind, stored: number | null | undefined, most = 6): string {
  if (stored === null || stored === undefined) return noNumber
  return withUnit(kind, formatGiven(toShown(kind, stored), most))
}

/** A stored number (N, mm, MPa ...) in the unit shown for its kind, without the unit. */
export function formatQuantity(kind: QuantityKind, stored: number | null | undefined, digits = 4): string {
  return stored === null || stored === undefined ? noNumber : formatNumber(toShown(kind, stored), digits)
}

/** The same with its unit. */
export function formatWithUnit(kind: QuantityKind, stored: number | null | undefined, digits = 4): string {
  return withUnit(kind, formatQuantity(kind, stored, digits))
}

function withUnit(kind: QuantityKind, text: string): string {
  const unit = unitOf(kind)
  if (text === noNumber || unit === '') return text
  return unit === '°' ? text + unit : `${text}${narrowSpace}${unit}`
}
