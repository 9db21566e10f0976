import type { Outline } from '#shared/document/analysisDocument.ts'
import { toBoundary } from '#shared/geometry/outline.ts'

/** SVG path of an outline in mm, with y turned down as SVG has it. */
export function toOutlinePath(outline: Outline): string {
  if (outline.kind === 'circle') {
    const r = outline.diameter / 2
    return `M${-r} 0A${r} ${r} 0 1 0 ${r} 0A${r} ${r} 0 1 0 ${-r} 0Z`
  }
  const pieces = toBoundary(outline).map((piece, i) => {
    const from = piece.kind === 'segment' ? piece.from : toArcPoint(piece.centre, piece.radius, piece.from)
    const to = piece.kind === 'segment' ? piece.to : toArcPoint(piece.centre, piece.radius, piece.to)
    const start = i === 0 ? `M${write(from)}` : ''
    // Counter-clockwise with y up is sweep 0 with y down.
    return piece.kind === 'segment'
      ? `${start}L${write(to)}`
      : `${start}A${piece.radius} ${piece.radius} 0 0 0 ${write(to)}`
  })
  return `${pieces.join('')}Z`
}

function toArcPoint([cx, cy]: readonly [number, number], radius: number, angle: number): [number, number] {
  return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)]
}

function write([x, y]: readonly [number, number]): string {
  return `${round(x)} ${round(-y)}`
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000 + 0
}
