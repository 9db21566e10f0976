/** Stands in for a solver that breaks down in mid-analysis. */
import { parentPort } from 'node:worker_threads'

parentPort.on('message', () => {
  throw new Error('broken inside')
})
parentPort.postMessage({ ready: true })
