/** Stands in for a solver that does not end. */
import { parentPort } from 'node:worker_threads'

parentPort.on('message', () => {
  for (;;) Math.random()
})
parentPort.postMessage({ ready: true })
