import type { BarGroup, BarLayout, Point } from '#shared/document/analysisDocument.ts'
import { computeBarCentres } from '#shared/geometry/bars.ts'

/** Bar groups that differ in nothing but place: edited together, shown on one row. */
export interface BarRow {
  /** Indices in the section. */
  members: number[]
  group: BarGroup
  /** Bars of all members. */
  count: number
}

export function groupAlikeBars(bars: readonly BarGroup[], together: boolean): BarRow[] {
  const rows = new Map<string, BarRow>()
  bars.forEach((group, index) => {
    const key = together ? describeMake(group, index) : String(index)
    const count = computeBarCentres(group.layout).length
    const row = rows.get(key)
    if (row) {
      row.members.push(index)
      row.count += count
    } else {
      rows.set(key, { members: [index], group, count })
    }
  })
  return [...rows.values()]
}

function describeMake(group: BarGroup, index: number): string {
  const { layout } = group
  if (layout.kind !== 'ring') return String(index)
  return ['ring', layout.diameter, layout.count, group.barDiameter, group.barArea, group.steel].join('|')
}

/** "-120, 340" a line; what people paste from a spreadsheet (tabs, semicolons) is understood too. */
export function parsePoints(text: string): { points: Point[] } | { line: number; found: string } {
  const points: Point[] = []
  const lines = text.split('\n')
  for (let i = 0; i < lines.length; i++) {
    const line = lines[i].trim()
    if (line === '') continue
    const numbers = line.split(/[\s,;]+/).map(Number)
    if (numbers.length !== 2 || !numbers.every(Number.isFinite)) return { line: i + 1, found: line }
    points.push([numbers[0], numbers[1]])
  }
  return { points }
}

export function formatPoints(points: readonly Point[]): string {
  return points.map(([x, y]) => `${x}, ${y}`).join('\n')
}

/** "ring", "line", "places" */
export function nameLayout(layout: BarLayout): string {
  return layout.kind === 'points' ? 'places' : layout.kind
}
