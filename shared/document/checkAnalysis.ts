/** Cases, and where the load and direction of the analysis come from. */
import type { Issue } from './analysisDocument.ts'
import { checkNames } from './checkNames.ts'
import { toPlainAngle } from './fillDefaults.ts'
import { listNames, quote } from './issueWords.ts'
import type { AnalysisDocumentInput } from './schema.ts'

/**
 * Load and direction stand in the analysis itself or in the case it names. A filled document carries both, so both may
 * stand there as long as they say the same.
 */
export function checkAnalysis({ cases = [], analysis }: AnalysisDocumentInput): Issue[] {
  const names = cases.map((one) => one.name)
  const issues = checkNames(names, (index) => `cases[${index}].name`)
  if (analysis.case === undefined) {
    if (analysis.axialLoad === undefined) {
      issues.push({
        path: 'analysis.axialLoad',
        code: 'missing',
        message: 'is missing',
        found: 'nothing',
        allowed: 'a number in N, compression positive, or the name of a case in analysis.case',
      })
    }
    return issues
  }
  const named = cases.find((one) => one.name === analysis.case)
  if (!named) {
    issues.push({
      path: 'analysis.case',
      code: 'unknown-case',
      message: 'names a case that is not defined',
      found: quote(analysis.case),
      allowed: listNames(names, 'nothing, since no case is defined'),
    })
    return issues
  }
  const mustAgree = (field: 'axialLoad' | 'angle', given: number | undefined, wanted: number) => {
    if (given === undefined || given === wanted) return
    issues.push({
      path: `analysis.${field}`,
      code: 'case-differs',
      message: `differs from the case ${quote(named.name)} that the analysis names`,
      found: String(given),
      allowed: `${wanted}, or nothing`,
    })
  }
  mustAgree('axialLoad', analysis.axialLoad, named.axialLoad)
  const angle = analysis.angle === undefined ? undefined : toPlainAngle(analysis.angle)
  mustAgree('angle', angle, toPlainAngle(named.angle ?? 0))
  return issues
}
