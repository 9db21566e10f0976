/**
 * The solver from the command line: `npm run -s analyse -- path/to/document.json`, or `-` for standard input.
 *
 * Exit codes: 0 solved, the result as JSON on standard output and nothing else; 2 the document is bad, one line per issue
 * on standard error; 3 no equilibrium even at zero curvature, a result with empty points on standard output.
 */
import { readFileSync } from 'node:fs'
import { formatIssue, parseDocumentText } from '#shared/document/readDocument.ts'
import type { Issue } from '#shared/document/analysisDocument.ts'
import { solveDocument } from './solver/analyse.ts'

const badDocument = 2
const noEquilibrium = 3

function refuse(issues: readonly Issue[]): never {
  for (const issue of issues) process.stderr.write(`${formatIssue(issue)}\n`)
  process.exit(badDocument)
}

function readText(argument: string): string {
  try {
    return readFileSync(argument === '-' ? 0 : argument, 'utf8')
  } catch (error) {
    return refuse([
      {
        path: '(document)',
        code: 'unreadable',
        message: 'cannot be read',
        found: error instanceof Error ? error.message : String(error),
        allowed: 'the path of a file, or - for standard input',
      },
    ])
  }
}

const [argument, ...others] = process.argv.slice(2)
if (argument === undefined || others.length > 0) {
  refuse([
    {
      path: '(document)',
      code: 'usage',
      message: 'is not named',
      found: `${process.argv.length - 2} arguments`,
      allowed: 'one: the path of a file, or - for standard input',
    },
  ])
}

const read = parseDocumentText(readText(argument))
if (read.status === 'bad') refuse(read.issues)
const result = solveDocument(read.document, () => performance.now())
process.exitCode = result.points.curvature.length > 0 ? 0 : noEquilibrium
process.stdout.write(`${JSON.stringify(result)}\n`)
