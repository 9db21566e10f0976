/** How issues name what they found. */

/** A value of any kind in a few words, on one line. */
export function describeValue(value: unknown): string {
  switch (typeof value) {
    case 'undefined':
      return 'nothing'
    case 'object':
      if (value === null) return 'null'
      return Array.isArray(value) ? `a list of ${value.length}` : 'an object'
    case 'string':
      return quote(value)
    case 'number':
    case 'boolean':
      return String(value)
    default:
      return `a ${typeof value}`
  }
}

/** A name or text in quotation marks, shortened where it is long. */
export function quote(text: string): string {
  const quoted = JSON.stringify(text)
  return quoted.length > 60 ? `${quoted.slice(0, 57)}..."` : quoted
}

/** Names in quotation marks, or the words for there being none. */
export function listNames(names: readonly string[], none: string): string {
  return names.length === 0 ? none : names.map(quote).join(', ')
}

/** A length, mm. */
export function mm(value: number): string {
  return `${shorten(value)} mm`
}

/** A stress, MPa, to six significant digits. */
export function mpa(value: number): string {
  return `${Number(value.toPrecision(6))} MPa`
}

/** A strain, to six significant digits. */
export function strain(value: number): string {
  return String(Number(value.toPrecision(6)))
}

/** A place in the section, mm. */
export function place(x: number, y: number): string {
  return `(${shorten(x)}, ${shorten(y)})`
}

/** One decimal; two significant digits where that leaves nothing; what rounding of sines leaves is nothing. */
function shorten(value: number): number {
  if (Math.abs(value) < 1e-6) return 0
  return Math.abs(value) < 0.05 ? Number(value.toPrecision(2)) : Math.round(value * 10) / 10
}
