/** What `npm start` does before the server can run. It is plain JavaScript, so it is asked in a process of its own. */
import { spawnSync } from 'node:child_process'
import { cpSync, mkdirSync, mkdtempSync, rmSync, unlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'

const root = fileURLToPath(new URL('../..', import.meta.url))
let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'girdwell-prepare-'))
  mkdirSync(join(folder, 'server'))
  for (const file of ['server/prepare.mjs', 'server/launch.mjs', 'package.json', 'package-lock.json']) {
    cpSync(join(root, file), join(folder, file))
  }
})
afterEach(() => rmSync(folder, { recursive: true }))

function run(expression: string) {
  const script = `const prepare = await import('./server/prepare.mjs'); console.log(await ${expression})`
  const done = spawnSync(process.execPath, ['--input-type=module', '-e', script], {
    cwd: folder,
    encoding: 'utf8',
    // An npm that fails at once: nothing here may install for real.
    env: { PATH: process.env.PATH, npm_execpath: join(folder, 'npm.js') },
  })
  return { status: done.status, out: done.stdout.trim(), error: done.stderr }
}

describe('the version of Node', () => {
  it.each(['20.19.0', '20.20.2', '22.12.0', '24.1.0'])('%s is taken', (version) => {
    expect(run(`prepare.checkNode('${version}')`).status).toBe(0)
  })

  it.each(['18.20.4', '20.18.3', '21.7.3', '22.11.0'])('%s is refused by name', (version) => {
    const { status, error } = run(`prepare.checkNode('${version}')`)
    expect(status).toBe(1)
    expect(error).toContain(
      `Girdwell needs Node 20.19 or later of 20, or 22.12 or later; this is ${version}.`,
    )
  })
})

describe('the hash of the sources', () => {
  const hash = () => run('prepare.hashSources()').out

  it('changes with a content, a name and a removal, and with nothing else', () => {
    const file = join(folder, 'server', 'index.ts')
    writeFileSync(file, 'one')
    const before = hash()
    expect(before).toMatch(/^[0-9a-f]{64}$/)
    writeFileSync(join(folder, 'README.md'), 'not a source')
    expect(hash()).toBe(before)
    writeFileSync(file, 'two')
    const changed = hash()
    expect(changed).not.toBe(before)
    writeFileSync(join(folder, 'server', 'another.ts'), 'two')
    unlinkSync(file)
    expect(hash()).not.toBe(changed)
    unlinkSync(join(folder, 'server', 'another.ts'))
    writeFileSync(file, 'one')
    expect(hash()).toBe(before)
  })
})

describe('an install that fails', () => {
  it('ends the start with a sentence, and leaves no stamp behind', () => {
    writeFileSync(
      join(folder, 'npm.js'),
      'console.log("npm was asked to", process.argv.slice(2).join(" ")); process.exit(7)',
    )
    const ask = () =>
      spawnSync(process.execPath, ['server/launch.mjs'], {
        cwd: folder,
        encoding: 'utf8',
        env: { PATH: process.env.PATH, npm_execpath: join(folder, 'npm.js') },
      })
    for (let times = 0; times < 2; times += 1) {
      const { status, stdout, stderr } = ask()
      expect(status).toBe(1)
      expect(stdout).toContain('npm was asked to ci --include=dev')
      expect(stderr).toMatch(/^Installing the packages failed\.[^\n]*\n$/)
    }
  })
})
