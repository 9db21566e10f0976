import { expose } from 'comlink'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { reactive } from 'vue'
import type { AnalyseReply } from '#shared/solverApi.ts'
import { createSolverClient, SolverStoppedError } from '@/clients/solverClient.ts'

const refused = (text: string): AnalyseReply => ({
  status: 'bad-document',
  issues: [{ path: '(document)', code: 'test', message: text }],
})

/** A worker as the client sees it: one end of a message channel with the solver's API behind the other. */
function createFakeWorker(analyse: (document: unknown) => AnalyseReply | Promise<AnalyseReply>) {
  const { port1, port2 } = new MessageChannel()
  expose({ analyse }, port2)
  const terminate = vi.fn(() => {
    port1.close()
    port2.close()
  })
  const crash = () => {
    const event = new Event('error', { cancelable: true })
    Object.defineProperty(event, 'message', { value: 'out of memory' })
    port1.dispatchEvent(event)
  }
  return { worker: Object.assign(port1, { terminate }) as unknown as Worker, terminate, crash }
}

describe('solverClient', () => {
  const clients: { dispose(): void }[] = []
  const create = (...args: Parameters<typeof createSolverClient>) => {
    const client = createSolverClient(...args)
    clients.push(client)
    return client
  }
  afterEach(() => clients.splice(0).forEach((client) => client.dispose()))

  it('sends a plain copy of a reactive document and brings the answer back', async () => {
    const seen: unknown[] = []
    const { worker } = createFakeWorker((document) => {
      seen.push(document)
      return refused('read')
    })
    const client = create({ startWorker: () => worker })
    const document = reactive({ title: 'Pier 3', section: { spirals: [{ pitch: 80 }] } })
    await expect(client.analyse(document)).resolves.toEqual(refused('read'))
    expect(seen).toEqual([{ title: 'Pier 3', section: { spirals: [{ pitch: 80 }] } }])
  })

  it('starts one worker and keeps it', async () => {
    const { worker } = createFakeWorker(() => refused('kept'))
    const startWorker = vi.fn(() => worker)
    const client = create({ startWorker })
    expect(startWorker).not.toHaveBeenCalled()
    await client.analyse({})
    await client.analyse({})
    expect(startWorker).toHaveBeenCalledTimes(1)
  })

  it('rejects what is pending when the worker crashes, and starts anew for the next call', async () => {
    const silent = createFakeWorker(() => new Promise<AnalyseReply>(() => {}))
    const sound = createFakeWorker(() => refused('after the crash'))
    const workers = [silent.worker, sound.worker]
    const client = create({ startWorker: () => workers.shift()! })
    const first = client.analyse({})
    const second = client.analyse({})
    silent.crash()
    await expect(first).rejects.toThrow(SolverStoppedError)
    await expect(second).rejects.toThrow('The solver stopped: out of memory. Compute again starts it anew.')
    expect(silent.terminate).toHaveBeenCalledTimes(1)
    await expect(client.analyse({})).resolves.toEqual(refused('after the crash'))
  })

  it('ends a worker that gives no answer in time, and only that one', async () => {
    const silent = createFakeWorker(() => new Promise<AnalyseReply>(() => {}))
    const sound = createFakeWorker(() => refused('in time'))
    const workers = [silent.worker, sound.worker]
    const client = create({ startWorker: () => workers.shift()!, timeLimit: 30 })
    await expect(client.analyse({})).rejects.toThrow('no answer within 0.03 s')
    await expect(client.analyse({})).resolves.toEqual(refused('in time'))
    await new Promise((resolve) => setTimeout(resolve, 60))
    expect(sound.terminate).not.toHaveBeenCalled()
  })

  it('passes on what the solver itself throws', async () => {
    const { worker } = createFakeWorker(() => {
      throw new Error('broken invariant')
    })
    const client = create({ startWorker: () => worker })
    await expect(client.analyse({})).rejects.toThrow('broken invariant')
  })
})
