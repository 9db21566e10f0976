/** The server as a process of its own, from its sources, as `npm run dev` runs it. */
import { spawn, type ChildProcess } from 'node:child_process'
import { createServer } from 'node:net'
import { fileURLToPath } from 'node:url'

const root = fileURLToPath(new URL('../..', import.meta.url))

export interface ServerProcess {
  child: ChildProcess
  /** What it has said so far, both streams. */
  output: () => string
  /** Exit code, once it has ended. */
  ended: Promise<number | null>
}

export function startServer(environment: Record<string, string>): ServerProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
    cwd: root,
    env: { PATH: process.env.PATH, ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const said: string[] = []
  child.stdout.on('data', (chunk) => said.push(String(chunk)))
  child.stderr.on('data', (chunk) => said.push(String(chunk)))
  const ended = new Promise<number | null>((resolve) => child.once('close', resolve))
  return { child, output: () => said.join(''), ended }
}

/** Resolves when it listens; rejects with what it said when it ends instead. */
export async function untilListening({ child, output }: ServerProcess): Promise<void> {
  const deadline = Date.now() + 20_000
  while (!output().includes(' is at http')) {
    if (child.exitCode !== null || Date.now() > deadline) throw new Error(`did not start: ${output()}`)
    await new Promise((resolve) => setTimeout(resolve, 30))
  }
}

export function findFreePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address()
      const port = typeof address === 'object' && address !== null ? address.port : 0
      probe.close(() => resolve(port))
    })
  })
}
