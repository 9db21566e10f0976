import type { Issue } from './analysisDocument.ts'
import { quote } from './issueWords.ts'

/** Names that stand twice. */
export function checkNames(names: readonly string[], pathOf: (index: number) => string): Issue[] {
  return names.flatMap((name, index) => {
    const first = names.indexOf(name)
    if (first === index) return []
    return [
      {
        path: pathOf(index),
        code: 'duplicate',
        message: `stands twice, first at ${pathOf(first)}`,
        found: quote(name),
        allowed: 'a name of its own',
      },
    ]
  })
}
