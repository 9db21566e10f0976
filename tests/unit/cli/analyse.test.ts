import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { loadFixture, loadInput, toFixturePath } from '../../helpers/fixtureDocuments.ts'

const root = fileURLToPath(new URL('../../..', import.meta.url))
/** Above what a busy machine takes; how long the command takes is no matter of a test. */
const patience = 30_000

interface Outcome {
  code: number | null
  stdout: string
  stderr: string
}

/** `npm run -s analyse -- ...args` in a process of its own; `pieces` of standard input come one after another. */
function run(args: string[], pieces: string[] = []): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const child = spawn('npm', ['run', '-s', 'analyse', '--', ...args], { cwd: root })
    let stdout = ''
    let stderr = ''
    child.stdout.setEncoding('utf8').on('data', (text: string) => (stdout += text))
    child.stderr.setEncoding('utf8').on('data', (text: string) => (stderr += text))
    child.on('error', reject)
    child.on('close', (code) => resolve({ code, stdout, stderr }))
    const feed = async () => {
      for (const piece of pieces) {
        child.stdin.write(piece)
        await new Promise((wait) => setTimeout(wait, 100))
      }
      child.stdin.end()
    }
    feed().catch(reject)
  })
}

describe('npm run -s analyse', { timeout: patience }, () => {
  let folder: string
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'girdwell-analyse-'))
  })
  afterAll(() => rmSync(folder, { recursive: true, force: true }))

  const save = (name: string, content: unknown) => {
    const path = join(folder, name)
    writeFileSync(path, typeof content === 'string' ? content : JSON.stringify(content))
    return path
  }

  it('answers a document with its result as JSON and nothing else, exit 0', async () => {
    const { code, stdout, stderr } = await run([toFixturePath('one-spiral')])
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
    const result = JSON.parse(stdout) as MomentCurvatureResult
    const digests = loadFixture('digests') as Record<string, string>
    expect(result.format).toBe('girdwell-result/1')
    expect(result.digest).toBe(digests['one-spiral'])
    expect(result.document).toEqual(loadFixture('one-spiral.filled'))
    expect(result.points.curvature.length).toBeGreaterThanOrEqual(200)
    expect(result.stop).toEqual({ reason: 'spiral-fracture', item: 'S1' })
    expect(stdout.trim()).toBe(JSON.stringify(result))
  })

  it('reads standard input, however slowly it comes', async () => {
    const text = JSON.stringify(loadInput('octagon-hoop'))
    const [piped, read] = await Promise.all([
      run(['-'], [text.slice(0, 200), text.slice(200)]),
      run([toFixturePath('octagon-hoop')]),
    ])
    expect(piped).toMatchObject({ code: 0, stderr: '' })
    const { diagnostics, ...result } = JSON.parse(piped.stdout) as MomentCurvatureResult
    expect(diagnostics.milliseconds).toBeGreaterThan(0)
    expect(JSON.parse(read.stdout)).toMatchObject(result)
  })

  it('a bad document: one line an issue on standard error, nothing on standard output, exit 2', async () => {
    const document = loadInput('one-spiral')
    document.materials.concrete.spallingStrain = 0.003
    if (document.section.spirals) document.section.spirals[0].pitch = 16
    const { code, stdout, stderr } = await run([save('bad.json', document)])
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' })
    expect(stderr).toBe(
      'section.spirals[0].pitch: must be larger than the bar of the spiral, found 16 mm, allowed more than 16 mm\n' +
        'materials.concrete.spallingStrain: must exceed twice the strain at peak stress, found 0.003, allowed more than 0.004\n',
    )
  })

  it('sound but no equilibrium at zero curvature: a result with empty points, exit 3', async () => {
    const document = loadInput('one-spiral')
    document.analysis.axialLoad = 1e9
    const { code, stdout, stderr } = await run(['-'], [JSON.stringify(document)])
    expect({ code, stderr }).toEqual({ code: 3, stderr: '' })
    const result = JSON.parse(stdout) as MomentCurvatureResult
    expect(result.stop).toEqual({ reason: 'no-equilibrium' })
    expect(result.points.curvature).toEqual([])
    expect(result.limitStates).toEqual([])
    expect(result.document.analysis.axialLoad).toBe(1e9)
  })

  it.concurrent.each([
    ['no argument', [], /^\(document\): is not named, found no argument, allowed one argument: .*\n$/],
    ['two arguments', ['a.json', 'b.json'], /^\(document\): must stand alone, found 2 arguments, .*\n$/],
    [
      'a file that is not there',
      ['/nowhere/at-all.json'],
      /^\(document\): cannot be read, found ENOENT.*\n$/,
    ],
    ['a folder', [root], /^\(document\): cannot be read, found EISDIR.*\n$/],
  ])('%s: one line, exit 2', async (_name, args, line) => {
    const { code, stdout, stderr } = await run(args)
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' })
    expect(stderr).toMatch(line)
  })

  it.concurrent.each([
    [
      'nothing',
      '',
      /^\(document\): is not JSON, found Unexpected end of JSON input, allowed one JSON object\n$/,
    ],
    ['half a document', '{"section": {', /^\(document\): is not JSON, found .+, allowed one JSON object\n$/],
    [
      'a list',
      '[]',
      /^\(document\): is not an analysis document, found a list of 0, allowed an object .*\n$/,
    ],
    [
      'another format',
      '{"format":"girdwell-analysis/7"}',
      /^format: is not known, found "girdwell-analysis\/7", .*\n$/,
    ],
  ])('%s on standard input: one line, exit 2', async (_name, text, line) => {
    const { code, stdout, stderr } = await run(['-'], [text])
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' })
    expect(stderr).toMatch(line)
  })
})
