import { createServer, type Server } from 'node:http'
import { createApp } from './app.ts'
import { readConfig, type Config } from './config.ts'
import { createContext, type Context } from './context.ts'
import { prepareOffice, type OfficeNews } from './services/office.ts'
import { StartError } from './startError.ts'
import { version } from './version.ts'

/** ms that requests under way are given when the server stops. */
const grace = 3_000
const day = 24 * 3600 * 1000

// Database and copies hold names, password hashes and the office's work: for the owner of the process only.
process.umask(0o077)

try {
  await run()
} catch (failure) {
  // What the person who started it can mend is one sentence; anything else is a fault of ours, with its stack.
  console.error(failure instanceof StartError ? failure.message : failure)
  process.exit(1)
}

async function run(): Promise<void> {
  const config = readConfig(process.env)
  const context = createContext(config)
  const news = await prepareOffice(context)
  const server = createServer(createApp(context))
  await listen(server, config)
  announce(config, news)
  keepSessionsTidy(context)
  stopOnSignal(server, context)
}

function listen(server: Server, { host, port }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', (cause: NodeJS.ErrnoException) => {
      if (cause.code === 'EADDRINUSE') {
        reject(
          new StartError(
            `Port ${port} on ${host} is taken. Stop what listens there, or set PORT to another number.`,
          ),
        )
      } else if (cause.code === 'EACCES' || cause.code === 'EADDRNOTAVAIL' || cause.code === 'ENOTFOUND') {
        reject(
          new StartError(
            `Cannot listen on ${host}, port ${port} (${cause.code}). Set HOST and PORT otherwise.`,
          ),
        )
      } else {
        reject(cause)
      }
    })
    server.listen(port, host, resolve)
  })
}

function announce({ host, port, publicUrl }: Config, { demo, newAdministrator }: OfficeNews): void {
  const shownHost = host.includes(':') ? `[${host}]` : host
  console.log(`Girdwell ${version} is at ${publicUrl?.origin ?? `http://${shownHost}:${port}`}`)
  if (newAdministrator !== null) {
    const { email, password } = newAdministrator
    console.log(
      `First administrator: ${email}, password ${password} (shown this once; change it under Account)`,
    )
  }
  if (demo.accounts.length > 0) {
    console.log(`Demo accounts, password ${demo.password} (this machine only):`)
    for (const { email, words } of demo.accounts) console.log(`  ${email}  ${words}`)
  }
}

function keepSessionsTidy({ sessions, log }: Context): void {
  const tidy = () =>
    sessions.removeExpired().catch((cause: unknown) => log.error({ err: cause }, 'expired sessions stay'))
  void tidy()
  setInterval(tidy, day).unref()
}

function stopOnSignal(server: Server, context: Context): void {
  let stopping = false
  async function stop() {
    // A second signal does not wait for what the first one waits for.
    if (stopping) process.exit(1)
    stopping = true
    const closed = new Promise((resolve) => server.close(resolve))
    server.closeIdleConnections()
    setTimeout(() => server.closeAllConnections(), grace).unref()
    await closed
    await context.close()
    process.exit(0)
  }
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop())
}
