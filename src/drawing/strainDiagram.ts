/** Strains over the depth at a state, drawn upright beside the section with the compressed side as it lies or on top. px. */
import type { Section } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { computeOutlineCentroid } from '#shared/geometry/outline.ts'
import { formatNumber } from '#shared/numberFormat.ts'
import { computeDirections } from './compressedSide.ts'
import { createUprightDimension, type DimensionLine } from './dimensionLines.ts'
import type { DrawingFrame } from './drawingFrame.ts'
import { findNeutralAxis, measureAlong, type DrawnState } from './neutralAxis.ts'
import { formatSize } from './size.ts'

export interface StrainDiagram {
  axisX: number
  axisTop: number
  axisBottom: number
  compressed: string
  profile: string
  /** Short level lines at the layers of bars. */
  layers: string
  peak: StrainLabel
  far: StrainLabel & { name: string }
  depth: DimensionLine | null
  caption: string
  captionY: number
  /** Upright here and level there: the neutral axis runs on into the diagram. */
  aligned: boolean
  neutralY: number | null
}

interface StrainLabel {
  text: string
  x: number
  y: number
}

/** Room of the profile either side of its axis. */
const tensionWidth = 72
const compressionWidth = 40
const axisOff = 82

export function createStrainDiagram(
  section: Section,
  frame: DrawingFrame,
  angle: number,
  state: DrawnState,
): StrainDiagram | null {
  if (frame.diagramLeft === null) return null
  const { outline } = section
  const { least, greatest } = measureAlong(outline, angle)
  const { v } = computeDirections(angle)
  const upright = v[1] > 0.9999
  const hanging = v[1] < -0.9999
  const centroid = computeOutlineCentroid(outline)
  // Askew, the depth along the direction is drawn as tall as the section is.
  const scale =
    upright || hanging
      ? frame.view.scale
      : Math.min(frame.view.scale, (frame.bottom - frame.top) / (greatest - least))
  const middle = (frame.top + frame.bottom) / 2 + ((greatest + least) / 2) * scale
  const toY = (height: number) =>
    upright
      ? frame.view.y(centroid[1] + height)
      : hanging
        ? frame.view.y(centroid[1] - height)
        : middle - height * scale
  const strainAt = (height: number) => state.axialStrain + state.curvature * height

  const layers = listLayers(section, angle)
  const farthest = layers[0] ?? least
  const most = Math.max(strainAt(greatest), strainAt(farthest), 0)
  const lowest = Math.min(strainAt(greatest), strainAt(farthest), 0)
  const perStrain = Math.min(
    most > 0 ? compressionWidth / most : Infinity,
    lowest < 0 ? tensionWidth / -lowest : Infinity,
  )
  const factor = Number.isFinite(perStrain) ? perStrain : 0
  const axisX = frame.diagramLeft + axisOff
  const toX = (height: number) => axisX + strainAt(height) * factor

  const neutral = findNeutralAxis(outline, angle, state)
  const [yPeak, yFar] = [toY(greatest), toY(farthest)]
  const zero = neutral === null ? null : toY(neutral)
  const compressedTo = zero === null ? { x: toX(farthest), y: yFar } : { x: axisX, y: zero }
  const outward = hanging ? -1 : 1
  return {
    axisX,
    axisTop: Math.min(toY(greatest), toY(least)),
    axisBottom: Math.max(toY(greatest), toY(least)),
    compressed:
      strainAt(greatest) > 0
        ? `M${axisX} ${yPeak}H${toX(greatest)}L${compressedTo.x} ${compressedTo.y}H${axisX}Z`
        : '',
    profile: `M${axisX} ${yPeak}H${toX(greatest)}L${toX(farthest)} ${yFar}H${axisX}`,
    layers: layers
      .slice(1)
      .map((height) => `M${axisX} ${toY(height)}H${toX(height)}`)
      .join(''),
    peak: {
      text: writeStrain(strainAt(greatest)),
      x: axisX + 4,
      y: outward > 0 ? yPeak - 7 : yPeak + 16,
    },
    far: {
      name: layers.length === 0 ? 'far face' : hanging ? 'highest bar' : upright ? 'lowest bar' : 'far bar',
      text: writeStrain(strainAt(farthest)),
      x: Math.max(axisX, toX(farthest)) + 6,
      y: outward > 0 ? yFar - 14 : yFar + 4,
    },
    depth: zero === null || neutral === null ? null : createDepth(greatest - neutral, yPeak, zero, axisX),
    caption: `strain, ${state.label}`,
    captionY: frame.bottom + (hanging ? 36 : 22),
    aligned: upright || hanging,
    neutralY: zero,
  }
}

function createDepth(depth: number, yPeak: number, zero: number, axisX: number): DimensionLine {
  return createUprightDimension(
    'neutral-axis-depth',
    Math.min(yPeak, zero),
    Math.max(yPeak, zero),
    axisX - 34,
    formatSize(Math.round(depth)),
    { tone: 'selected', from: axisX },
  )
}

/** Heights (mm) of the bars along the direction of bending, farthest from the compressed side first, alike ones once. */
function listLayers(section: Section, angle: number): number[] {
  const { v } = computeDirections(angle)
  const [ox, oy] = computeOutlineCentroid(section.outline)
  const heights = placeBars(section.bars)
    .map((bar) => (bar.x - ox) * v[0] + (bar.y - oy) * v[1])
    .sort((a, b) => a - b)
  return heights.filter((height, i) => i === 0 || height - heights[i - 1] > 4)
}

function writeStrain(strain: number): string {
  return (strain > 0 ? '+' : '') + formatNumber(strain, 3)
}

/** Bars whose strain has passed yield, in the order of `placeBars`. */
export function listYielded(
  section: Section,
  angle: number,
  state: DrawnState,
  yieldStrains: Readonly<Record<string, number>>,
): boolean[] {
  const { v } = computeDirections(angle)
  const [ox, oy] = computeOutlineCentroid(section.outline)
  return placeBars(section.bars).map((bar) => {
    const height = (bar.x - ox) * v[0] + (bar.y - oy) * v[1]
    const limit = yieldStrains[bar.steel]
    return limit !== undefined && Math.abs(state.axialStrain + state.curvature * height) >= limit
  })
}
