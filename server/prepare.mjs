/**
 * What `npm start` and `npm test` do before anything of ours can run: check Node, install, build.
 * Node built-ins only, since nothing is installed yet. Each step is skipped when its stamp says that it is done.
 */
import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = fileURLToPath(new URL('..', import.meta.url))
const at = (...parts) => join(root, ...parts)

const installStamp = at('node_modules', '.girdwell-installed')
const buildStamp = at('dist', '.girdwell-built')
const addon = at('node_modules', 'better-sqlite3', 'build', 'Release', 'better_sqlite3.node')
/** What the build is made from. */
const sources = [
  'index.html',
  'vite.config.ts',
  'package.json',
  'package-lock.json',
  'public',
  'server',
  'shared',
  'src',
  'workers',
]

/** Why preparing failed, in a sentence for the person at the terminal. */
export class PrepareError extends Error {
  name = 'PrepareError'
}

/** Same ranges as `engines` in package.json. */
export function checkNode(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number)
  if ((major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22) return
  throw new PrepareError(
    `Girdwell needs Node 20.19 or later of 20, or 22.12 or later; this is ${version}. Install one of those and start again.`,
  )
}

/** Installs what the lock file names unless it is there, and compiles the database driver when it does not load. */
export async function ensureInstalled() {
  checkNode()
  const wanted = hashOf([
    readFileSync(at('package-lock.json')),
    process.versions.modules,
    process.platform,
    process.arch,
  ])
  if (readStamp(installStamp) === wanted && existsSync(addon)) return
  if (!matchesLock()) {
    console.log(
      'Installing packages; the first time this compiles the database driver and takes about two minutes ...',
    )
    runNpm(
      // Building needs the development packages, whatever NODE_ENV says.
      ['ci', '--include=dev'],
      'Installing the packages failed. Look at what npm said above; a package registry must be reachable.',
    )
  }
  if (!addonLoads()) {
    console.log('Compiling the database driver for this Node ...')
    runNpm(
      ['rebuild', 'better-sqlite3'],
      'Compiling the database driver failed. It needs python3, make, a C++ compiler and the headers of Node.',
    )
    if (!addonLoads())
      throw new PrepareError('The database driver does not load. Delete node_modules and start again.')
  }
  // Last, so that a step that was broken off is done again.
  writeFileSync(installStamp, wanted)
}

/** Builds page and server into dist unless they were built from these very sources. */
export async function ensureBuilt() {
  const wanted = hashSources()
  if (readStamp(buildStamp) === wanted) return
  console.log('Building page and server ...')
  const { status } = spawnSync(process.execPath, [at('server', 'build.mjs')], { cwd: root, stdio: 'inherit' })
  if (status !== 0) throw new PrepareError('The build failed; what it said stands above.')
}

/** Written by server/build.mjs when everything else is. */
export function writeBuildStamp(hash) {
  mkdirSync(at('dist'), { recursive: true })
  writeFileSync(buildStamp, hash)
}

/** Of names and contents, so that a file that went away or an older checkout counts as a change. */
export function hashSources() {
  const hash = createHash('sha256')
  for (const file of sources.flatMap(listFiles)) hash.update(`${file}\0`).update(readFileSync(at(file)))
  return hash.digest('hex')
}

function listFiles(path) {
  if (!existsSync(at(path))) return []
  const entries = readEntries(at(path))
  if (entries === null) return [path]
  return entries
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) =>
      entry.isDirectory() ? listFiles(`${path}/${entry.name}`) : [`${path}/${entry.name}`],
    )
}

/** null for what is no folder. */
function readEntries(path) {
  try {
    return readdirSync(path, { withFileTypes: true })
  } catch (failure) {
    if (failure.code === 'ENOTDIR') return null
    throw failure
  }
}

/** Whether node_modules holds just what the lock names, put there by any npm command. */
function matchesLock() {
  const installedFile = at('node_modules', '.package-lock.json')
  if (!existsSync(installedFile)) return false
  const installed = JSON.parse(readFileSync(installedFile, 'utf8')).packages
  const locked = JSON.parse(readFileSync(at('package-lock.json'), 'utf8')).packages
  const isThere = ([path, entry]) => {
    if (path === '') return true
    // Builds for other platforms are in the lock and not on the disk.
    if (installed[path] === undefined) return entry.optional === true
    return installed[path].version === entry.version && existsSync(at(path, 'package.json'))
  }
  return Object.entries(locked).every(isThere) && Object.keys(installed).every((path) => path in locked)
}

/** In a process of its own, since an addon built for another Node can end the one that loads it. */
function addonLoads() {
  const script = `new (require('better-sqlite3'))(':memory:').close()`
  return spawnSync(process.execPath, ['-e', script], { cwd: root, stdio: 'ignore' }).status === 0
}

function runNpm(args, failure) {
  // The npm that runs this script, or the one on the path.
  const npm = process.env.npm_execpath
  const [command, ...first] = npm?.endsWith('.js') ? [process.execPath, npm] : ['npm']
  const { status } = spawnSync(command, [...first, ...args], {
    cwd: root,
    stdio: 'inherit',
    shell: process.platform === 'win32' && command === 'npm',
    // The driver's install script would first ask outside the registry for a compiled one.
    env: { ...process.env, npm_config_build_from_source: 'true' },
  })
  if (status !== 0) throw new PrepareError(failure)
}

function readStamp(file) {
  return existsSync(file) ? readFileSync(file, 'utf8') : null
}

function hashOf(parts) {
  const hash = createHash('sha256')
  for (const part of parts) hash.update(part).update('\0')
  return hash.digest('hex')
}
