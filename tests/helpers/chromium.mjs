import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'

const usualPlaces = [
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome-stable',
  '/usr/bin/google-chrome',
  '/snap/bin/chromium',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
]

/** Path of a Chromium, undefined where there is none. `CHROMIUM_PATH` goes before the usual places. */
export function findChromium() {
  const named = process.env.CHROMIUM_PATH
  if (named) return existsSync(named) ? named : undefined
  return usualPlaces.find((path) => existsSync(path))
}

/** Path of a Chromium; as root on Debian it installs the distribution's own package first. Ends the process without one. */
export function ensureChromium() {
  const found = findChromium()
  if (found) return found
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    console.log('Installing Chromium for the browser tests (Debian package chromium) ...')
    const apt = (...args) =>
      spawnSync('apt-get', args, {
        stdio: ['ignore', 'ignore', 'inherit'],
        env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
      })
    apt('update')
    apt('install', '-y', '--no-install-recommends', 'chromium')
    const installed = findChromium()
    if (installed) return installed
  }
  console.error(
    'The browser tests need Chromium: install it (on Debian "apt-get install chromium" as root) or name one in CHROMIUM_PATH.',
  )
  process.exit(1)
}
