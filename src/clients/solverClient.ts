/**
 * The only door to the solver's worker. It sends plain snapshots (a reactive proxy cannot be cloned), answers every
 * call exactly once, and turns a worker that crashed or fell silent into a rejected promise and a fresh worker.
 */
import { releaseProxy, wrap, type Remote } from 'comlink'
import type { AnalyseReply, SolverApi } from '#shared/solverApi.ts'

export class SolverStoppedError extends Error {
  override name = 'SolverStoppedError'
  readonly code = 'solver-stopped'
}

export interface SolverClient {
  /** Solves one document. Rejects with `SolverStoppedError` when the worker crashed or gave no answer in time. */
  analyse(document: unknown): Promise<AnalyseReply>
  /** Ends the worker; the next call starts a new one. */
  dispose(): void
}

interface SolverClientOptions {
  /** @default the module worker of the application */
  startWorker?: () => Worker
  /** How long one run may take, ms. @default 20 000 */
  timeLimit?: number
}

export function createSolverClient(options: SolverClientOptions = {}): SolverClient {
  const { startWorker = startAnalysisWorker, timeLimit = 20_000 } = options
  let running: { worker: Worker; remote: Remote<SolverApi> } | null = null
  const rejectPending = new Set<(reason: SolverStoppedError) => void>()

  function ensureRunning() {
    if (running) return running
    const worker = startWorker()
    worker.addEventListener('error', (event) => {
      event.preventDefault()
      stop(`The solver stopped: ${event.message || 'its program could not be loaded'}.`)
    })
    worker.addEventListener('messageerror', () => stop('The solver sent an answer that cannot be read.'))
    running = { worker, remote: wrap<SolverApi>(worker) }
    return running
  }

  function stop(why: string) {
    const reason = new SolverStoppedError(`${why} Compute again starts it anew.`)
    release()
    for (const reject of [...rejectPending]) reject(reason)
    rejectPending.clear()
  }

  function release() {
    if (!running) return
    running.remote[releaseProxy]()
    running.worker.terminate()
    running = null
  }

  function analyse(document: unknown): Promise<AnalyseReply> {
    const { remote } = ensureRunning()
    const plain: unknown = JSON.parse(JSON.stringify(document))
    return new Promise((resolve, reject) => {
      const watch = setTimeout(
        () => stop(`The solver gave no answer within ${timeLimit / 1000} s.`),
        timeLimit,
      )
      const giveUp = (reason: SolverStoppedError) => {
        clearTimeout(watch)
        reject(reason)
      }
      rejectPending.add(giveUp)
      remote
        .analyse(plain)
        .then(resolve, reject)
        .finally(() => {
          clearTimeout(watch)
          rejectPending.delete(giveUp)
        })
    })
  }

  return {
    analyse,
    dispose: () => stop('The solver was closed.'),
  }
}

function startAnalysisWorker(): Worker {
  return new Worker(new URL('../../workers/analysis.worker.ts', import.meta.url), { type: 'module' })
}

/** One worker for the whole application: a curve takes milliseconds, so calls simply queue. */
export const solverClient = createSolverClient()
