/** `npm run build`: the page into dist/client, the server into dist/server. */
import { cpSync, readFileSync, rmSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { build as bundle } from 'esbuild'
import { build as buildPage } from 'vite'
import { hashSources, writeBuildStamp } from './prepare.mjs'

const root = fileURLToPath(new URL('..', import.meta.url))
const at = (path) => `${root}${path}`
const { dependencies } = JSON.parse(readFileSync(at('package.json'), 'utf8'))

// Taken first: a source that changes while this runs makes the build stale, as it should.
const hash = hashSources()
rmSync(at('dist'), { recursive: true, force: true })

await buildPage({ root, logLevel: 'warn' })

await bundle({
  absWorkingDir: root,
  entryPoints: {
    index: 'server/index.ts',
    verificationThread: 'server/services/verificationThread.ts',
  },
  outdir: 'dist/server',
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  sourcemap: true,
  // By name rather than all packages at once, so that our own #shared, #workers and #server are bundled.
  external: Object.keys(dependencies),
  logLevel: 'warning',
})
cpSync(at('server/db/migrations'), at('dist/server/migrations'), { recursive: true })

// Last, so that a build that was broken off is done again.
writeBuildStamp(hash)
console.log('Built dist/client and dist/server.')
