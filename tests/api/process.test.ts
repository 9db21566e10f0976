import { mkdtempSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { demoAccounts, demoPassword } from '#server/db/seed/demoAccounts.ts'
import { findFreePort, startServer, untilListening, type ServerProcess } from '../helpers/apiProcess.ts'

let data: string
let port: number
let started: ServerProcess[]
beforeEach(async () => {
  data = mkdtempSync(join(tmpdir(), 'girdwell-process-'))
  port = await findFreePort()
  started = []
})
afterEach(async () => {
  for (const { child, ended } of started) {
    child.kill('SIGKILL')
    await ended
  }
  rmSync(data, { recursive: true })
})

function start(environment: Record<string, string> = {}): ServerProcess {
  const server = startServer({ PORT: String(port), GIRDWELL_DATA: join(data, 'office'), ...environment })
  started.push(server)
  return server
}

describe('the server process', () => {
  it('says its address and the demo accounts, serves, and stops cleanly on SIGTERM', async () => {
    const server = start()
    await untilListening(server)
    const health = await fetch(`http://127.0.0.1:${port}/api/health`)
    expect(await health.json()).toMatchObject({ status: 'ok', database: 'ok' })
    const output = server.output()
    expect(output).toContain(`is at http://127.0.0.1:${port}`)
    expect(output.split(demoPassword)).toHaveLength(2)
    for (const { email } of demoAccounts) expect(output).toContain(email)
    // Names, hashes and the office's work are for the owner of the process only.
    for (const path of ['office', 'office/girdwell.sqlite']) {
      expect(statSync(join(data, path)).mode & 0o077, path).toBe(0)
    }

    server.child.kill('SIGTERM')
    expect(await server.ended).toBe(0)
    expect(server.output()).not.toMatch(/error/i)
  })

  it('lets the demo designer sign in and see the demo job, and stops on SIGINT with a connection open', async () => {
    const server = start()
    await untilListening(server)
    const designer = demoAccounts.find(({ jobRole }) => jobRole === 'designer')
    const base = `http://127.0.0.1:${port}`
    const signIn = await fetch(`${base}/api/sign-in`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', Origin: base },
      body: JSON.stringify({ email: designer?.email, password: demoPassword }),
    })
    expect(signIn.status).toBe(200)
    const cookie = signIn.headers.getSetCookie()[0].split(';')[0]
    const jobs = await fetch(`${base}/api/jobs`, { headers: { Cookie: cookie } })
    const { items } = await jobs.json()
    expect(items[0].title).toBe('Tern Creek Crossing')
    server.child.kill('SIGINT')
    expect(await server.ended).toBe(0)
  })

  it('says in one sentence that the port is taken', async () => {
    const first = start()
    await untilListening(first)
    const second = start({ GIRDWELL_DATA: join(data, 'other') })
    expect(await second.ended).toBe(1)
    expect(second.output().trim()).toBe(
      `Port ${port} on 127.0.0.1 is taken. Stop what listens there, or set PORT to another number.`,
    )
    expect((await fetch(`http://127.0.0.1:${port}/api/health`)).status).toBe(200)
  })

  it('does not listen for others while demo accounts are open, and says how to close them', async () => {
    const refused = start({ HOST: '0.0.0.0' })
    expect(await refused.ended).toBe(1)
    expect(refused.output()).toContain('GIRDWELL_DEMO=off')
    expect(refused.output().trim().split('\n')).toHaveLength(1)

    const own = start({ HOST: '0.0.0.0', GIRDWELL_DEMO: 'off', GIRDWELL_ADMIN_EMAIL: 'lead@office.test' })
    await untilListening(own)
    expect(own.output()).toContain('lead@office.test')
    expect(own.output()).not.toContain(demoPassword)
    own.child.kill('SIGTERM')
    expect(await own.ended).toBe(0)

    // From then on HOST alone is enough.
    const later = start({ HOST: '0.0.0.0' })
    await untilListening(later)
    expect(later.output()).not.toContain('password')
  })

  it('says in one sentence what is wrong with a variable', async () => {
    const server = start({ GIRDWELL_PUBLIC_URL: 'office' })
    expect(await server.ended).toBe(1)
    expect(server.output()).toMatch(/^GIRDWELL_PUBLIC_URL is "office": [^\n]+\n$/)
  })
})
