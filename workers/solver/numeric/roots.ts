/**
 * Root of a continuous function in a bracket by the method of Chandrupatla.
 *
 * Source: T. R. Chandrupatla, "A new hybrid quadratic/bisection algorithm for finding the zero of a nonlinear function
 * without using derivatives", Advances in Engineering Software 28(3), 145-149, 1997.
 *
 * f(a) and f(b) must not have the same sign. Stops when |b - a| <= 2 (xTolerance + 2^-52 |x|), or after `most` calls.
 * Returns the end of the last bracket with the smaller |f|.
 */
export function findRoot(
  f: (x: number) => number,
  a: number,
  b: number,
  xTolerance: number,
  fa = f(a),
  fb = f(b),
  most = 100,
): number {
  if (fa === 0) return a
  if (fb === 0) return b
  if (fa > 0 === fb > 0) throw new Error(`No sign change between ${a} (${fa}) and ${b} (${fb})`)
  let t = 0.5
  let x1 = b
  let f1 = fb
  let x2 = a
  let f2 = fa
  for (let call = 0; call < most; call++) {
    const x = x1 + t * (x2 - x1)
    const fx = f(x)
    let x3: number
    let f3: number
    if (fx > 0 === f1 > 0) {
      x3 = x1
      f3 = f1
    } else {
      x3 = x2
      f3 = f2
      x2 = x1
      f2 = f1
    }
    x1 = x
    f1 = fx
    const best = Math.abs(f2) < Math.abs(f1) ? x2 : x1
    const tolerance = (2 * Number.EPSILON * Math.abs(best) + xTolerance) / Math.abs(x2 - x1)
    if (tolerance > 0.5 || f1 === 0) return f1 === 0 ? x1 : best
    const xi = (x1 - x2) / (x3 - x2)
    const phi = (f1 - f2) / (f3 - f2)
    // Inverse quadratic interpolation only where it is safe, bisection otherwise.
    const safe = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi
    t = safe
      ? (f1 / (f2 - f1)) * (f3 / (f2 - f3)) + ((x3 - x1) / (x2 - x1)) * (f1 / (f3 - f1)) * (f2 / (f3 - f2))
      : 0.5
    t = Math.min(1 - tolerance, Math.max(tolerance, t))
  }
  return Math.abs(f2) < Math.abs(f1) ? x2 : x1
}
