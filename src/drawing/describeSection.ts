import type { Section } from '#shared/document/analysisDocument.ts'
import { computeOutlineBounds } from '#shared/geometry/outline.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { formatSize } from './dimensionLines.ts'

/** A section in one sentence, for those who do not see the drawing. */
export function describeSection(section: Section): string {
  const { minX, maxX, minY, maxY } = computeOutlineBounds(section.outline)
  const shape = { circle: 'Circular', rectangle: 'Rectangular', oblong: 'Oblong', polygon: 'Polygonal' }[
    section.outline.kind
  ]
  const spirals = section.spirals
    .map(
      (spiral) =>
        `${spiral.id} diameter ${formatSize(spiral.diameter)}, bar ${formatSize(spiral.barDiameter)} at pitch ${formatSize(spiral.pitch)}`,
    )
    .join('; ')
  const voids =
    section.voids.length === 0
      ? ''
      : `, ${section.voids.length} round ${section.voids.length === 1 ? 'void' : 'voids'}`
  return `${shape} section ${formatSize(maxX - minX)} by ${formatSize(maxY - minY)} millimetres${voids}. ${
    spirals === '' ? 'No spiral' : `Spirals: ${spirals}`
  }. ${placeBars(section.bars).length} longitudinal bars.`
}
