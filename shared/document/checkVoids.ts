import { computeClearance } from '../geometry/outline.ts'
import type { Issue, Section } from './analysisDocument.ts'
import { mm } from './issueWords.ts'
import { leavesOutline, measureDistance, slack } from './placing.ts'

/** Voids lie in the outline, with concrete round them, and apart from one another. */
export function checkVoids({ outline, voids }: Section, isOutlineSound: boolean): Issue[] {
  return voids.flatMap((hole, i): Issue[] => {
    const path = `section.voids[${i}]`
    const issues: Issue[] = []
    if (isOutlineSound) {
      const room = computeClearance(outline, hole.centre) - hole.diameter / 2
      if (room < slack) issues.push(leavesOutline(path, 'the void', Math.max(0, -room)))
    }
    for (let j = 0; j < i; j++) {
      const gap = measureDistance(hole.centre, voids[j].centre) - (hole.diameter + voids[j].diameter) / 2
      if (gap >= slack) continue
      issues.push({
        path,
        code: 'voids-overlap',
        message: `overlaps void ${j + 1}`,
        found: `${mm(Math.max(0, -gap))} overlap`,
        allowed: 'voids apart from one another',
      })
    }
    return issues
  })
}
