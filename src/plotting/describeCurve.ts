import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { formatNumber, formatWithUnit } from '#shared/numberFormat.ts'
import { describeStop } from './limitStateNames.ts'

/** A curve in a sentence or two, for those who do not see it. */
export function describeCurve(result: MomentCurvatureResult): string {
  const { analysis } = result.document
  const at = `Moment-curvature at axial load ${formatWithUnit('force', analysis.axialLoad, 5)}, bending direction ${formatWithUnit('angle', analysis.angle)}.`
  const peak = result.limitStates.find((state) => state.kind === 'peak-moment')
  const greatest = peak
    ? ` The greatest moment is ${formatWithUnit('moment', peak.moment)} at curvature ${formatWithUnit('curvature', peak.curvature)}.`
    : ''
  const { ductility } = result.idealised
  const ductile = ductility === null ? '' : ` Curvature ductility ${formatNumber(ductility, 3)}.`
  return `${at}${greatest} ${describeStop(result)}${ductile}`
}
