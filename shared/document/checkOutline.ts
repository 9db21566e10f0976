import { computeOutlineArea, findCrossingSides } from '../geometry/outline.ts'
import type { Issue, Outline, Point } from './analysisDocument.ts'
import { mm } from './issueWords.ts'

/** Area below which a polygon is a line, mm2. */
const leastArea = 1

/** Rules of the outline alone. */
export function checkOutline(outline: Outline): Issue[] {
  switch (outline.kind) {
    case 'rectangle':
      return checkChamfer(outline)
    case 'polygon':
      return checkPolygon(outline.points)
    default:
      return []
  }
}

function checkChamfer({ width, depth, chamfer }: { width: number; depth: number; chamfer: number }): Issue[] {
  const most = Math.min(width, depth) / 2
  if (chamfer < most) return []
  return [
    {
      path: 'section.outline.chamfer',
      code: 'chamfer',
      message: 'leaves nothing of the sides',
      found: mm(chamfer),
      allowed: `less than ${mm(most)}`,
    },
  ]
}

function checkPolygon(points: Point[]): Issue[] {
  const path = 'section.outline.points'
  const crossing = findCrossingSides(points)
  if (crossing) {
    const [first, second] = crossing
    return [
      {
        path,
        code: 'self-crossing',
        message: 'cross or touch themselves',
        found: first === second ? `corner ${first + 1} twice` : `sides ${first + 1} and ${second + 1}`,
        allowed: 'a simple polygon',
      },
    ]
  }
  const area = computeOutlineArea({ kind: 'polygon', points })
  if (area >= leastArea) return []
  return [
    {
      path,
      code: 'no-area',
      message: 'enclose no area',
      found: `${Number(area.toPrecision(3))} mm²`,
      allowed: `at least ${leastArea} mm²`,
    },
  ]
}
