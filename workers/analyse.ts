/**
 * The solver from the command line: `npm run -s analyse -- path/to/document.json`, or `-` for standard input.
 *
 * Exit codes: 0 solved, the result as JSON on standard output and nothing else; 2 the document is bad, one line per issue
 * on standard error; 3 no equilibrium even at zero curvature, a result with empty points on standard output.
 */
import { readFile } from 'node:fs/promises'
import { text } from 'node:stream/consumers'
import type { Issue } from '#shared/document/analysisDocument.ts'
import { formatIssue, parseDocumentText } from '#shared/document/readDocument.ts'
import { solveDocument } from './solver/analyse.ts'

const exitCodes = { solved: 0, badDocument: 2, noEquilibrium: 3 }
const usage = 'one argument: the path of a file, or - for standard input'

function refuse(issues: readonly Issue[]): void {
  process.exitCode = exitCodes.badDocument
  process.stderr.write(issues.map((issue) => `${formatIssue(issue)}\n`).join(''))
}

/** The text that the arguments name, or why there is none. */
async function readText(args: readonly string[]): Promise<string | Issue> {
  const aboutDocument = { path: '(document)', allowed: usage }
  const [path, ...others] = args
  if (path === undefined) {
    return { ...aboutDocument, code: 'usage', message: 'is not named', found: 'no argument' }
  }
  if (others.length > 0) {
    return { ...aboutDocument, code: 'usage', message: 'must stand alone', found: `${args.length} arguments` }
  }
  try {
    // Standard input may be slow or not block: read as a stream it is whole all the same.
    return path === '-' ? await text(process.stdin) : await readFile(path, 'utf8')
  } catch (error) {
    const found = error instanceof Error ? error.message : String(error)
    return { ...aboutDocument, code: 'unreadable', message: 'cannot be read', found }
  }
}

function solve(document: string): void {
  const read = parseDocumentText(document)
  if (read.status === 'bad') return refuse(read.issues)
  const result = solveDocument(read.document, () => performance.now())
  process.exitCode = result.points.curvature.length > 0 ? exitCodes.solved : exitCodes.noEquilibrium
  process.stdout.write(`${JSON.stringify(result)}\n`)
}

// A reader that has seen enough closes the pipe: that is no fault.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error
})

const document = await readText(process.argv.slice(2))
if (typeof document === 'string') solve(document)
else refuse([document])
