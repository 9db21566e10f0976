import { placeBars, type PlacedBar } from '../geometry/bars.ts'
import { computeClearance } from '../geometry/outline.ts'
import type { Issue, Section } from './analysisDocument.ts'
import { mm, place } from './issueWords.ts'
import { leavesOutline, measureDistance, slack } from './placing.ts'
import { bounds } from './schema.ts'

/** Longitudinal bars lie in concrete with their whole circle and apart from one another. */
export function checkBars(section: Section, isOutlineSound: boolean): Issue[] {
  const count = section.bars.reduce((sum, { layout }) => sum + countOf(layout), 0)
  if (count > bounds.barCount) {
    return [
      {
        path: 'section.bars',
        code: 'too-large',
        message: 'are too many bars',
        found: `${count} bars`,
        allowed: `at most ${bounds.barCount} bars`,
      },
    ]
  }
  const bars = placeBars(section.bars)
  const issues: Issue[] = []
  // One issue a group and kind: a ring that is too large would otherwise fill the page.
  const told = new Set<string>()
  const tell = (group: number, issue: Issue) => {
    const key = `${group}|${issue.code}`
    if (told.has(key)) return
    told.add(key)
    issues.push(issue)
  }
  for (const bar of bars) {
    if (isOutlineSound) {
      const room = computeClearance(section.outline, [bar.x, bar.y]) - bar.diameter / 2
      if (room < -slack) tell(bar.group, leavesOutline(pathOf(bar), nameOf(bar), -room))
    }
    section.voids.forEach((hole, v) => {
      const into = (hole.diameter + bar.diameter) / 2 - measureDistance(hole.centre, [bar.x, bar.y])
      if (into <= slack) return
      tell(bar.group, {
        path: pathOf(bar),
        code: 'bar-in-void',
        message: `${nameOf(bar)} reaches into void ${v + 1}`,
        found: `${mm(into)} inside`,
        allowed: 'bars wholly in concrete',
      })
    })
  }
  for (const [bar, other, overlap] of listOverlaps(bars)) {
    tell(bar.group, {
      path: pathOf(bar),
      code: 'bars-overlap',
      message: `${nameOf(bar)} overlaps the one at ${place(other.x, other.y)}`,
      found: `${mm(overlap)} overlap`,
      allowed: 'bars apart from one another',
    })
  }
  return issues
}

/** Pairs of bars whose circles overlap, the later group first; sorted by x, so that many bars cost little. */
function* listOverlaps(bars: readonly PlacedBar[]): Generator<[PlacedBar, PlacedBar, number]> {
  const order = [...bars].sort((a, b) => a.x - b.x)
  const widest = bars.reduce((most, bar) => Math.max(most, bar.diameter), 0)
  for (let i = 0; i < order.length; i++) {
    const a = order[i]
    for (let j = i + 1; j < order.length && order[j].x - a.x < widest; j++) {
      const b = order[j]
      const overlap = (a.diameter + b.diameter) / 2 - Math.hypot(a.x - b.x, a.y - b.y)
      if (overlap > slack) yield a.group > b.group ? [a, b, overlap] : [b, a, overlap]
    }
  }
}

function countOf(layout: Section['bars'][number]['layout']): number {
  return layout.kind === 'points' ? layout.points.length : layout.count
}

function pathOf(bar: PlacedBar): string {
  return `section.bars[${bar.group}].layout`
}

function nameOf(bar: PlacedBar): string {
  return `the bar at ${place(bar.x, bar.y)}`
}
