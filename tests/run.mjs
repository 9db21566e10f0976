/**
 * `npm test`: installs what is missing, then type-check, lint, unit, component, reference, API and real-browser tests.
 * Arguments go on to Vitest: `npm test -- --project api`, `npm test -- tests/unit/shared`.
 * Node built-ins only, so that it runs on a machine where nothing is installed yet.
 */
import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureBuilt, ensureInstalled } from '../server/prepare.mjs'
import { ensureChromium } from './helpers/chromium.mjs'

const root = fileURLToPath(new URL('..', import.meta.url))
const vitestArguments = process.argv.slice(2)

/** Runs a program of node_modules/.bin and tells whether it was content. */
function runTool(title, name, args, environment = {}) {
  console.log(`\n== ${title}`)
  const startedAt = Date.now()
  const { status } = spawnSync(process.execPath, [join(root, 'node_modules', ...name), ...args], {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, ...environment },
  })
  console.log(
    `== ${title}: ${status === 0 ? 'passed' : 'FAILED'} in ${((Date.now() - startedAt) / 1000).toFixed(1)} s`,
  )
  return status === 0
}

await ensureInstalled()
const chromium = ensureChromium()
const whole = vitestArguments.length === 0
const checks = []
if (whole) {
  checks.push(runTool('type-check', ['vue-tsc', 'bin', 'vue-tsc.js'], ['--build']))
  checks.push(runTool('lint', ['eslint', 'bin', 'eslint.js'], ['.', '--max-warnings', '0']))
  checks.push(runTool('format', ['prettier', 'bin', 'prettier.cjs'], ['--check', '--log-level', 'warn', '.']))
}
await ensureBuilt()

const folder = mkdtempSync(join(tmpdir(), 'girdwell-test-'))
const report = join(folder, 'report.json')
const testsPassed = runTool(
  'tests',
  ['vitest', 'vitest.mjs'],
  ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...vitestArguments],
  { CHROMIUM_PATH: chromium },
)

let passed = checks.filter(Boolean).length
let failed = checks.length - passed
try {
  const counts = JSON.parse(readFileSync(report, 'utf8'))
  passed += counts.numPassedTests
  // A file that could not even be loaded has no failed test of its own.
  failed += Math.max(counts.numFailedTests, counts.success ? 0 : 1)
} catch {
  failed += 1
} finally {
  rmSync(folder, { recursive: true, force: true })
}
if (!testsPassed && failed === 0) failed = 1

console.log(`\n${passed} passed, ${failed} failed`)
process.exitCode = failed === 0 ? 0 : 1
