import type { Issue } from '#shared/document/analysisDocument.ts'

/** The sentence for a field: what is wrong there, found and allowed; undefined when nothing is. */
export function findIssueText(issues: readonly Issue[], path: string): string | undefined {
  const issue = issues.find((one) => one.path === path)
  return issue && describeIssue(issue)
}

export function describeIssue(issue: Issue): string {
  const parts = [issue.message]
  if (issue.found !== undefined) parts.push(`found ${issue.found}`)
  if (issue.allowed !== undefined) parts.push(`allowed ${issue.allowed}`)
  return parts.join(', ')
}
