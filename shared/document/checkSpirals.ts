import { computeClearance } from '../geometry/outline.ts'
import type { Issue, Section, Spiral, Void } from './analysisDocument.ts'
import { checkNames } from './checkNames.ts'
import { mm } from './issueWords.ts'
import { leavesOutline, measureDistance, slack } from './placing.ts'

/** Spirals have names of their own, can be coiled, and lie in concrete with their whole bar. */
export function checkSpirals({ outline, voids, spirals }: Section, isOutlineSound: boolean): Issue[] {
  const ids = checkNames(
    spirals.map((spiral) => spiral.id),
    (index) => `section.spirals[${index}].id`,
  )
  const placed = spirals.flatMap((spiral, i): Issue[] => {
    const path = `section.spirals[${i}]`
    const issues = checkCoil(spiral, path)
    if (isOutlineSound) {
      const room = computeClearance(outline, spiral.centre) - (spiral.diameter + spiral.barDiameter) / 2
      if (room < -slack) issues.push(leavesOutline(`${path}.diameter`, `spiral ${spiral.id}`, -room))
    }
    issues.push(...checkVoidsOf(spiral, voids, path))
    return issues
  })
  return [...ids, ...placed]
}

function checkCoil({ diameter, barDiameter, pitch, form }: Spiral, path: string): Issue[] {
  const issues: Issue[] = []
  if (diameter <= barDiameter) {
    issues.push({
      path: `${path}.diameter`,
      code: 'spiral-diameter',
      message: `must exceed the bar of the ${form}`,
      found: mm(diameter),
      allowed: `more than ${mm(barDiameter)}`,
    })
  }
  if (pitch <= barDiameter) {
    issues.push({
      path: `${path}.pitch`,
      code: 'pitch',
      message: `must be larger than the bar of the ${form}`,
      found: mm(pitch),
      allowed: `more than ${mm(barDiameter)}`,
    })
  }
  return issues
}

function checkVoidsOf(spiral: Spiral, voids: readonly Void[], path: string): Issue[] {
  const outer = (spiral.diameter + spiral.barDiameter) / 2
  const inner = (spiral.diameter - spiral.barDiameter) / 2
  return voids.flatMap((hole, v): Issue[] => {
    const apart = measureDistance(spiral.centre, hole.centre)
    const isBeside = apart >= outer + hole.diameter / 2 - slack
    const isRound = apart + hole.diameter / 2 <= inner + slack
    if (isBeside || isRound) return []
    return [
      {
        path: `${path}.diameter`,
        code: 'spiral-in-void',
        message: `the wire of spiral ${spiral.id} passes through void ${v + 1}`,
        found: mm(spiral.diameter),
        allowed: 'a spiral round the void or clear of it',
      },
    ]
  })
}
