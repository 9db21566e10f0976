/** Rules of the section that need its geometry. Lengths in mm. */
import type { AnalysisDocument, Issue, Outline, Point, Section } from './analysisDocument.ts'
import { checkNames } from './checkMaterials.ts'
import { placeBars, type PlacedBar } from '../geometry/bars.ts'
import { computeClearance, computeOutlineArea, findCrossingSides } from '../geometry/outline.ts'

/** Slack for numbers that were rounded on the screen, mm. */
const slack = 1e-6

export function checkSection({ section, materials }: AnalysisDocument): Issue[] {
  const outlineIssues = checkOutline(section.outline)
  const named = checkSteelNames(section, Object.keys(materials.steels))
  const ids = checkNames(
    section.spirals.map((spiral) => spiral.id),
    (index) => `section.spirals[${index}].id`,
  )
  const pitches = section.spirals.flatMap((spiral, index): Issue[] =>
    spiral.pitch > spiral.barDiameter
      ? []
      : [
          {
            path: `section.spirals[${index}].pitch`,
            code: 'pitch',
            message: 'must be larger than the bar of the spiral',
            found: mm(spiral.pitch),
            allowed: `more than ${mm(spiral.barDiameter)}`,
          },
        ],
  )
  // Without a sound outline, inside and outside mean nothing.
  if (outlineIssues.length > 0) return [...outlineIssues, ...named, ...ids, ...pitches]
  return [
    ...named,
    ...ids,
    ...pitches,
    ...checkVoids(section),
    ...checkSpirals(section),
    ...checkBars(section),
  ]
}

function checkOutline(outline: Outline): Issue[] {
  const path = 'section.outline'
  switch (outline.kind) {
    case 'rectangle': {
      const most = Math.min(outline.width, outline.depth) / 2
      if (outline.chamfer < most) return []
      return [
        {
          path: `${path}.chamfer`,
          code: 'chamfer',
          message: 'leaves nothing of the sides',
          found: mm(outline.chamfer),
          allowed: `less than ${mm(most)}`,
        },
      ]
    }
    case 'polygon': {
      const crossing = findCrossingSides(outline.points)
      if (crossing) {
        return [
          {
            path: `${path}.points`,
            code: 'self-crossing',
            message: 'cross or touch themselves',
            found:
              crossing[0] === crossing[1]
                ? `corner ${crossing[0] + 1} twice`
                : `sides ${crossing[0] + 1} and ${crossing[1] + 1}`,
            allowed: 'a simple polygon',
          },
        ]
      }
      if (computeOutlineArea(outline) >= 1) return []
      return [
        {
          path: `${path}.points`,
          code: 'no-area',
          message: 'enclose no area',
          found: 'points on a line',
          allowed: 'a polygon with an area',
        },
      ]
    }
    default:
      return []
  }
}

function checkSteelNames(section: Section, known: readonly string[]): Issue[] {
  const check = (steel: string, path: string): Issue[] =>
    known.includes(steel)
      ? []
      : [
          {
            path,
            code: 'unknown-steel',
            message: 'names a steel that is not defined in materials.steels',
            found: JSON.stringify(steel),
            allowed:
              known.length === 0 ? 'none is defined' : known.map((name) => JSON.stringify(name)).join(', '),
          },
        ]
  return [
    ...section.spirals.flatMap((spiral, i) => check(spiral.steel, `section.spirals[${i}].steel`)),
    ...section.bars.flatMap((group, i) => check(group.steel, `section.bars[${i}].steel`)),
  ]
}

function checkVoids({ outline, voids }: Section): Issue[] {
  return voids.flatMap((hole, i): Issue[] => {
    const path = `section.voids[${i}]`
    const room = computeClearance(outline, hole.centre) - hole.diameter / 2
    const issues: Issue[] = []
    if (room <= 0) issues.push(leaves(path, 'the void', -room))
    for (let j = 0; j < i; j++) {
      const gap = distance(hole.centre, voids[j].centre) - (hole.diameter + voids[j].diameter) / 2
      if (gap < slack) {
        issues.push({
          path,
          code: 'voids-overlap',
          message: `overlaps void ${j + 1}`,
          found: `${mm(-gap)} overlap`,
          allowed: 'voids apart from one another',
        })
      }
    }
    return issues
  })
}

function checkSpirals({ outline, voids, spirals }: Section): Issue[] {
  return spirals.flatMap((spiral, i): Issue[] => {
    const issues: Issue[] = []
    const outer = (spiral.diameter + spiral.barDiameter) / 2
    const inner = (spiral.diameter - spiral.barDiameter) / 2
    const path = `section.spirals[${i}].diameter`
    if (inner <= 0) {
      issues.push({
        path,
        code: 'spiral-diameter',
        message: 'must exceed the bar of the spiral',
        found: mm(spiral.diameter),
        allowed: `more than ${mm(spiral.barDiameter)}`,
      })
    }
    const room = computeClearance(outline, spiral.centre) - outer
    if (room < -slack) issues.push(leaves(path, `spiral ${spiral.id}`, -room))
    voids.forEach((hole, v) => {
      const apart = distance(spiral.centre, hole.centre)
      const outside = apart >= outer + hole.diameter / 2 - slack
      const round = apart + hole.diameter / 2 <= inner + slack
      if (outside || round) return
      issues.push({
        path,
        code: 'spiral-in-void',
        message: `the wire of spiral ${spiral.id} passes through void ${v + 1}`,
        found: `diameter ${mm(spiral.diameter)}`,
        allowed: 'a spiral round the void or clear of it',
      })
    })
    return issues
  })
}

function checkBars(section: Section): Issue[] {
  const bars = placeBars(section.bars)
  const issues: Issue[] = []
  // One issue a group and kind: a ring that is too large would otherwise fill the page.
  const told = new Set<string>()
  const tell = (group: number, issue: Omit<Issue, 'path'>) => {
    const key = `${group}|${issue.code}`
    if (told.has(key)) return
    told.add(key)
    issues.push({ path: `section.bars[${group}].layout`, ...issue })
  }
  for (const bar of bars) {
    const room = computeClearance(section.outline, [bar.x, bar.y]) - bar.diameter / 2
    if (room < -slack) {
      const { code, message, found, allowed } = leaves('', `the bar ${at(bar)}`, -room)
      tell(bar.group, { code, message, found, allowed })
    }
    section.voids.forEach((hole, v) => {
      const into = hole.diameter / 2 + bar.diameter / 2 - distance(hole.centre, [bar.x, bar.y])
      if (into > slack) {
        tell(bar.group, {
          code: 'bar-in-void',
          message: `the bar ${at(bar)} reaches into void ${v + 1}`,
          found: `${mm(into)} inside`,
          allowed: 'bars wholly in concrete',
        })
      }
    })
  }
  for (const { bar, other, overlap } of findOverlaps(bars)) {
    tell(bar.group, {
      code: 'bars-overlap',
      message: `the bars ${at(bar)} and ${at(other)} overlap`,
      found: `${mm(overlap)} overlap`,
      allowed: 'bars apart from one another',
    })
  }
  return issues
}

/** Pairs of bars whose circles overlap; sorted by x first, so that many bars cost little. */
function findOverlaps(bars: readonly PlacedBar[]): { bar: PlacedBar; other: PlacedBar; overlap: number }[] {
  const order = [...bars].sort((a, b) => a.x - b.x)
  const widest = bars.reduce((most, bar) => Math.max(most, bar.diameter), 0)
  const pairs: { bar: PlacedBar; other: PlacedBar; overlap: number }[] = []
  for (let i = 0; i < order.length; i++) {
    for (let j = i + 1; j < order.length && order[j].x - order[i].x < widest; j++) {
      const overlap =
        (order[i].diameter + order[j].diameter) / 2 -
        Math.hypot(order[i].x - order[j].x, order[i].y - order[j].y)
      if (overlap <= slack) continue
      const [other, bar] = order[i].group <= order[j].group ? [order[i], order[j]] : [order[j], order[i]]
      pairs.push({ bar, other, overlap })
    }
  }
  return pairs
}

function leaves(path: string, what: string, by: number): Issue {
  return {
    path,
    code: 'outside',
    message: `${what} leaves the outline`,
    found: `${mm(by)} outside`,
    allowed: 'wholly inside the outline',
  }
}

function at(bar: PlacedBar): string {
  return `at (${round(bar.x)}, ${round(bar.y)})`
}

function mm(value: number): string {
  return `${round(value)} mm`
}

function round(value: number): number {
  const rounded = Math.abs(value) < 0.05 ? Number(value.toPrecision(2)) : Math.round(value * 10) / 10
  return rounded === 0 ? 0 : rounded
}

function distance([ax, ay]: Point, [bx, by]: Point): number {
  return Math.hypot(ax - bx, ay - by)
}
