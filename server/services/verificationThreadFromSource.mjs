/** Starts a thread that is written in TypeScript, in development and tests; the build has it as JavaScript. */
import { workerData } from 'node:worker_threads'
import { register } from 'tsx/esm/api'

register()
await import(workerData)
