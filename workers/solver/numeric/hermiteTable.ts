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
  /** Below this argument the finer pieces at the end of the table hold; 0: there are none. */
  headTop: number
  headInverseWidth: number
  /** Place of the first finer piece in `coefficients`. */
  headStart: number
}

/** The finer pieces of a table with a head: they stand for the first two pieces, each cut into sixteen. */
const headSpan = 2
const headCuts = 16

/**
 * Tabulates f with its derivative on [0, top] in `pieces` pieces; top > 0, pieces >= headSpan. With a head, functions whose
 * higher derivatives have no bound at 0 (x^1.2) are met there too.
 */
export function createHermiteTable(
  compute: (x: number) => number,
  computeSlope: (x: number) => number,
  top: number,
  pieces: number,
  withHead = false,
): HermiteTable {
  if (!(top > 0) || pieces < headSpan)
    throw new Error(`A table needs top > 0 and pieces >= ${headSpan}, found ${top} and ${pieces}`)
  const h = top / pieces
  const headPieces = withHead ? headSpan * headCuts : 0
  const headStart = 4 * (pieces + 1)
  const coefficients = new Float64Array(headStart + 4 * headPieces)
  fillPieces(compute, computeSlope, h, pieces, coefficients.subarray(0, headStart))
  fillPieces(compute, computeSlope, h / headCuts, headPieces, coefficients.subarray(headStart))
  return {
    top,
    inverseWidth: pieces / top,
    coefficients,
    headTop: withHead ? headSpan * h * (1 - 1e-12) : 0,
    headInverseWidth: (headCuts * pieces) / top,
    headStart,
  }
}

/** Coefficients of pieces of width h from 0 on, and one constant slope behind the last where there is room. */
function fillPieces(
  compute: (x: number) => number,
  computeSlope: (x: number) => number,
  h: number,
  pieces: number,
  coefficients: Float64Array,
): void {
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
  if (coefficients.length > 4 * pieces) {
    coefficients[4 * pieces] = y0
    coefficients[4 * pieces + 1] = m0
  }
}
