/** Lengths and stresses as words of a warning. */
export function mm(value: number): string {
  return `${Number(value.toFixed(1))} mm`
}

export function mpa(value: number): string {
  return `${Number(value.toPrecision(4))} MPa`
}
