import type { Section } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { computeOutlineBounds } from '#shared/geometry/outline.ts'
import { groupAlike } from '@/editing/spiralGroups.ts'
import { formatSize } from './size.ts'

/** A section in a few sentences, for those who do not see the drawing. */
export function describeSection(section: Section): string {
  const { minX, maxX, minY, maxY } = computeOutlineBounds(section.outline)
  const shape = { circle: 'Circular', rectangle: 'Rectangular', oblong: 'Oblong', polygon: 'Polygonal' }[
    section.outline.kind
  ]
  const size =
    section.outline.kind === 'circle'
      ? `of diameter ${formatSize(maxX - minX)}`
      : `${formatSize(maxX - minX)} by ${formatSize(maxY - minY)}`
  const voids = section.voids
    .map((hole) => `, ${hole.lining ? 'lined void' : 'void'} of diameter ${formatSize(hole.diameter)}`)
    .join('')
  const spirals = groupAlike(section.spirals)
    .map(({ name, members: [spiral] }) => {
      const bar = `bar ${formatSize(spiral.barDiameter)} at pitch ${formatSize(spiral.pitch)}`
      return `${name} of diameter ${formatSize(spiral.diameter)}, ${bar}`
    })
    .join('; ')
  const bars = placeBars(section.bars).length
  return [
    `${shape} section ${size} mm${voids}.`,
    section.spirals.length === 0 ? 'No spiral.' : `Spirals ${spirals}.`,
    `${bars === 0 ? 'No' : bars} longitudinal bars.`,
  ].join(' ')
}
