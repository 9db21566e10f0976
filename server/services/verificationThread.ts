/** The thread in which the server runs the solver, so that a long analysis holds up no other request. */
import { parentPort } from 'node:worker_threads'
import { analyse } from '#workers/solver/analyse.ts'
import type { ThreadAnswer, ThreadTask } from './verificationProtocol.ts'

if (parentPort === null) throw new Error('verificationThread runs as a worker thread only')
const port = parentPort

port.on('message', ({ run, document }: ThreadTask) => {
  port.postMessage(solve(run, document))
})
port.postMessage({ ready: true } satisfies ThreadAnswer)

function solve(run: number, document: unknown): ThreadAnswer {
  try {
    return { run, reply: analyse(document) }
  } catch (cause) {
    // A fault of the solver is told, not swallowed: the other side turns it into an error with its cause.
    return { run, fault: cause instanceof Error ? (cause.stack ?? cause.message) : String(cause) }
  }
}
