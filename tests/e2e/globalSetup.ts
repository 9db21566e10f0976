import { spawn, type ChildProcess } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { TestProject } from 'vitest/node'

declare module 'vitest' {
  export interface ProvidedContext {
    /** Where the production build under test listens. */
    baseUrl: string
  }
}

const root = fileURLToPath(new URL('../..', import.meta.url))

/** Serves the production build on a free port with a fresh demo database, as `npm start` does. */
export default async function setup(project: TestProject) {
  const port = await findFreePort()
  const data = mkdtempSync(join(tmpdir(), 'girdwell-e2e-'))
  const server = spawn(process.execPath, ['server/launch.mjs'], {
    cwd: root,
    env: {
      ...process.env,
      HOST: '127.0.0.1',
      PORT: String(port),
      GIRDWELL_DATA: data,
      NODE_ENV: 'production',
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const output: string[] = []
  server.stdout.on('data', (chunk) => output.push(String(chunk)))
  server.stderr.on('data', (chunk) => output.push(String(chunk)))
  const baseUrl = `http://127.0.0.1:${port}`
  await waitForHealth(baseUrl, server, output)
  project.provide('baseUrl', baseUrl)
  return async () => {
    await stop(server)
    rmSync(data, { recursive: true, force: true })
  }
}

async function waitForHealth(baseUrl: string, server: ChildProcess, output: string[]) {
  const deadline = Date.now() + 110_000
  while (Date.now() < deadline) {
    if (server.exitCode !== null) break
    const answer = await fetch(`${baseUrl}/api/health`).catch(() => null)
    if (answer?.ok) return
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  server.kill('SIGKILL')
  throw new Error(`The server under test did not start:\n${output.join('')}`)
}

function stop(server: ChildProcess): Promise<void> {
  if (server.exitCode !== null) return Promise.resolve()
  return new Promise((resolve) => {
    const force = setTimeout(() => server.kill('SIGKILL'), 5_000)
    server.once('exit', () => {
      clearTimeout(force)
      resolve()
    })
    server.kill('SIGTERM')
  })
}

function findFreePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address()
      probe.close(() =>
        typeof address === 'object' && address ? resolve(address.port) : reject(new Error('no port')),
      )
    })
  })
}
