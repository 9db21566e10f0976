/**
 * A function on [0, top] as cubic Hermite pieces of equal width: value and slope are continuous and the slope is the
 * exact derivative of the value, so that Newton's method sees one consistent function.
 *
 * Error per piece of width h: h^4 max|f''''| / 384.
 */
export interface HermiteTable {
  /** Beyond this argument the table does not hold. */
  top: number
  /** 1 / h */
  inverseWidth: number
  /** Four coefficients a piece, in t = x / h - i: c0 + t (c1 + t (c2 + t c3)). */
  coefficients: Float64Array
}

/** Tabulates f with its derivative on [0, top] in `pieces` pieces; top > 0, pieces >= 1. */
export function createHermiteTable(
  compute: (x: number) => number,
  computeSlope: (x: number) => number,
  top: number,
  pieces: number,
): HermiteTable {
  if (!(top > 0) || pieces < 1)
    throw new Error(`A table needs top > 0 and pieces >= 1, found ${top} and ${pieces}`)
  const h = top / pieces
  const coefficients = new Float64Array(4 * (pieces + 1))
  let y0 = compute(0)
  let m0 = computeSlope(0) * h
  for (let i = 0; i < pieces; i++) {
    const x1 = (i + 1) * h
    const y1 = compute(x1)
    const m1 = computeSlope(x1) * h
    const rise = y1 - y0
    coefficients[4 * i] = y0
    coefficients[4 * i + 1] = m0
    coefficients[4 * i + 2] = 3 * rise - 2 * m0 - m1
    coefficients[4 * i + 3] = m0 + m1 - 2 * rise
    y0 = y1
    m0 = m1
  }
  // The argument `top` itself falls on the piece behind the last one.
  coefficients[4 * pieces] = y0
  coefficients[4 * pieces + 1] = m0
  return { top, inverseWidth: pieces / top, coefficients }
}
