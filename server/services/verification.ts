/** The only door from the server to the solver: one worker thread, one analysis at a time, each within a time limit. */
import { Worker } from 'node:worker_threads'
import type { AnalyseReply } from '#shared/solverApi.ts'
import { RequestError } from '../errors.ts'
import { bundled } from '../folders.ts'
import type { ThreadAnswer, ThreadTask } from './verificationProtocol.ts'

export interface Verifier {
  /** Rejects with `solver-timeout` when the time limit is passed or too many are waiting. */
  analyse: (document: unknown) => Promise<AnalyseReply>
  /** Ends the thread; what is running is rejected. */
  close: () => Promise<void>
}

export interface VerifierOptions {
  /** ms for one analysis, once its thread is ready. */
  timeLimit: number
  /** Analyses that may wait their turn. */
  waitingLimit?: number
  thread?: URL
}

const threadFile = new URL(bundled ? './verificationThread.js' : './verificationThread.ts', import.meta.url)

export function createVerifier({
  timeLimit,
  waitingLimit = 20,
  thread = threadFile,
}: VerifierOptions): Verifier {
  let worker: Promise<Worker> | undefined
  let runs = 0
  let waiting = 0
  let tail: Promise<unknown> = Promise.resolve()
  let closed = false

  /** The warm thread, or a new one after the last was ended or died. */
  function takeWorker(): Promise<Worker> {
    if (worker === undefined) {
      const started = startThread(thread, () => {
        if (worker === started) worker = undefined
      })
      worker = started
    }
    return worker
  }

  async function run(document: unknown): Promise<AnalyseReply> {
    if (closed) throw new Error('the verifier is closed')
    const taken = await takeWorker()
    const task: ThreadTask = { run: ++runs, document }
    const answer = await ask(taken, task, timeLimit).catch(async (failure: unknown) => {
      // A synchronous solver hears no message: ending its thread is the only way to stop it.
      worker = undefined
      await taken.terminate()
      throw failure
    })
    if ('fault' in answer) throw new Error(`the solver failed: ${answer.fault}`)
    return answer.reply
  }

  return {
    analyse(document) {
      if (waiting >= waitingLimit) {
        return Promise.reject(
          new RequestError(
            503,
            'solver-timeout',
            'Too many sheets are being saved just now. Try again in a minute.',
          ),
        )
      }
      waiting += 1
      const turn = tail.then(() => run(document)).finally(() => (waiting -= 1))
      // The next in line starts whether this one succeeds or not; its own caller hears of a failure.
      tail = turn.catch(() => undefined)
      return turn
    },
    async close() {
      closed = true
      const running = await worker?.catch(() => undefined)
      await running?.terminate()
    },
  }
}

/** Resolves when the thread has loaded the solver, so that loading does not count against the time limit. */
function startThread(file: URL, onEnd: () => void): Promise<Worker> {
  return new Promise((resolve, reject) => {
    const worker = createThread(file)
    // An idle thread keeps no process alive.
    worker.unref()
    worker.once('message', () => resolve(worker))
    worker.once('error', reject)
    worker.once('exit', (code) => {
      onEnd()
      reject(new Error(`the solver's thread ended with code ${code} before it was ready`))
    })
  })
}

function createThread(file: URL): Worker {
  if (!file.pathname.endsWith('.ts')) return new Worker(file)
  // From source, under tsx or Vitest: a thread inherits no loader, and Node 20 ignores --import in its execArgv.
  return new Worker(new URL('./verificationThreadFromSource.mjs', import.meta.url), { workerData: file.href })
}

type Outcome = Extract<ThreadAnswer, { run: number }>

function ask(worker: Worker, task: ThreadTask, timeLimit: number): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const limit = setTimeout(() => {
      settle()
      reject(
        new RequestError(
          503,
          'solver-timeout',
          `The analysis took longer than the ${timeLimit / 1000} s that are allowed. Ask for fewer points, or simplify the section.`,
        ),
      )
    }, timeLimit)
    const onMessage = (answer: ThreadAnswer) => {
      if (!('run' in answer) || answer.run !== task.run) return
      settle()
      resolve(answer)
    }
    const onError = (cause: Error) => {
      settle()
      reject(new Error("the solver's thread failed", { cause }))
    }
    const onExit = (code: number) => {
      settle()
      reject(new Error(`the solver's thread ended with code ${code} in mid-analysis`))
    }
    function settle() {
      clearTimeout(limit)
      worker.off('message', onMessage).off('error', onError).off('exit', onExit)
    }
    worker.on('message', onMessage).once('error', onError).once('exit', onExit)
    worker.postMessage(task)
  })
}
