/** Revision letters as drawings carry them: 1 is A, 26 is Z, 27 is AA. `index` is a whole number from 1. */
export function toRevisionLetters(index: number): string {
  if (!Number.isInteger(index) || index < 1) throw new RangeError(`no revision letters for ${index}`)
  let letters = ''
  for (let rest = index; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters
  }
  return letters
}
