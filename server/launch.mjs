/** `npm start`: installs and builds what is missing, then runs the server in this very process, so that signals reach it. */
import { checkNode, ensureBuilt, ensureInstalled } from './prepare.mjs'

try {
  checkNode()
  await ensureInstalled()
  await ensureBuilt()
} catch (failure) {
  console.error(failure.name === 'PrepareError' ? failure.message : failure)
  process.exit(1)
}
process.env.NODE_ENV ??= 'production'
await import(new URL('../dist/server/index.js', import.meta.url).href)
