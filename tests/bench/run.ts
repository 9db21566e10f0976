/**
 * `npm run bench`: how long an analysis takes, from the document object to the solution object; validation, digest and JSON
 * are left out. `-- --json` prints `[{ name, medianMs, firstMs, n }]` and nothing else. Each benchmark runs in a process of its
 * own, so that the first call is the first.
 */
import { spawnSync } from 'node:child_process'
import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { readDocument } from '#shared/document/readDocument.ts'
import { solveMomentCurvature } from '#workers/solver/analyses/momentCurvature.ts'

interface Measured {
  name: string
  medianMs: number
  firstMs: number
  n: number
}

/** Section of tests/fixtures/sections by benchmark. */
const benchmarks: Record<string, string> = {
  'moment-curvature/five-spiral': 'p3-five-spiral-square',
  'moment-curvature/circular': 'p1-circular-spiral',
}
/** Warm runs before measuring, and measured. */
const warmUp = 150
const runs = 200

function measure(name: string): Measured {
  const file = new URL(`../fixtures/sections/${benchmarks[name]}.json`, import.meta.url)
  const { document } = JSON.parse(readFileSync(file, 'utf8'))
  const read = readDocument({ ...document, analysis: { ...document.analysis, points: 200 } })
  if (read.status === 'bad') throw new Error(`${name}: ${read.issues[0].path} ${read.issues[0].message}`)
  const time = () => {
    const startedAt = performance.now()
    solveMomentCurvature(read.document)
    return performance.now() - startedAt
  }
  const firstMs = time()
  for (let i = 0; i < warmUp; i++) time()
  const times = Array.from({ length: runs }, time).sort((a, b) => a - b)
  return { name, medianMs: round(times[runs / 2]), firstMs: round(firstMs), n: runs }
}

function round(ms: number): number {
  return Math.round(ms * 1000) / 1000
}

function measureApart(name: string): Measured {
  const { stdout, status } = spawnSync(
    process.execPath,
    ['--import', 'tsx', fileURLToPath(import.meta.url), '--only', name],
    { encoding: 'utf8', stdio: ['ignore', 'pipe', 'inherit'] },
  )
  if (status !== 0) throw new Error(`The benchmark ${name} ended with ${status}`)
  return JSON.parse(stdout) as Measured
}

const only = process.argv.indexOf('--only')
if (only !== -1) {
  console.log(JSON.stringify(measure(process.argv[only + 1])))
} else {
  const measured = Object.keys(benchmarks).map(measureApart)
  if (process.argv.includes('--json')) console.log(JSON.stringify(measured))
  else console.table(measured)
}
