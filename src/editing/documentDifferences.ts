export interface Difference {
  /** `section.spirals[0].pitch` */
  path: string
  mine: string
  theirs: string
}

/** Every value in which two plain documents differ, by path; what only one of them has reads "absent" on the other side. */
export function listDifferences(mine: unknown, theirs: unknown, path = ''): Difference[] {
  if (Object.is(mine, theirs)) return []
  if (isBranch(mine) && isBranch(theirs) && Array.isArray(mine) === Array.isArray(theirs)) {
    const keys = new Set([...Object.keys(mine), ...Object.keys(theirs)])
    return [...keys].flatMap((key) => {
      const step = Array.isArray(mine) ? `[${key}]` : path === '' ? key : `.${key}`
      return listDifferences(mine[key], theirs[key], path + step)
    })
  }
  return [{ path: path === '' ? '(whole)' : path, mine: describe(mine), theirs: describe(theirs) }]
}

function isBranch(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null
}

function describe(value: unknown): string {
  if (value === undefined) return 'absent'
  return typeof value === 'object' ? JSON.stringify(value) : String(value)
}
