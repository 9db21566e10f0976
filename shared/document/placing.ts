/** What the checks of voids, spirals and bars share. Lengths in mm. */
import type { Issue, Point } from './analysisDocument.ts'
import { mm } from './issueWords.ts'

/** Slack for numbers that were rounded on the screen or in a ring's cosine, mm. */
export const slack = 1e-6

export function leavesOutline(path: string, what: string, by: number): Issue {
  return {
    path,
    code: 'outside',
    message: `${what} leaves the outline`,
    found: `${mm(by)} outside`,
    allowed: 'wholly inside the outline',
  }
}

export function measureDistance([ax, ay]: Point, [bx, by]: Point): number {
  return Math.hypot(ax - bx, ay - by)
}
