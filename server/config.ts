import { resolve } from 'node:path'
import { z } from 'zod'
import { StartError } from './startError.ts'

const logLevels = ['fatal', 'error', 'warn', 'info', 'debug', 'silent'] as const

/** The environment, read once; nothing else in the server looks at it. */
export interface Config {
  host: string
  port: number
  /** Absolute. */
  dataFolder: string
  /** Where people reach the server, when something stands in front of it; null: at the host they ask for, by http. */
  publicUrl: URL | null
  /** Number of proxies in front whose X-Forwarded-For is believed. */
  trustedProxies: number
  /** False: no demo is seeded and its accounts are closed. */
  demo: boolean
  /** Becomes the first administrator where there is none of the office's own. */
  adminEmail: string | null
  logLevel: (typeof logLevels)[number]
  /** ms a verification may take. */
  solverTimeLimit: number
}

const environmentSchema = z.object({
  HOST: z.string().trim().min(1).default('127.0.0.1'),
  PORT: z.coerce.number().int().min(1).max(65_535).default(4780),
  GIRDWELL_DATA: z.string().trim().min(1).default('./data'),
  GIRDWELL_PUBLIC_URL: z
    .url({ protocol: /^https?$/ })
    .optional()
    .transform((text) => (text === undefined ? null : new URL(text))),
  GIRDWELL_TRUSTED_PROXIES: z.coerce.number().int().min(0).max(10).default(0),
  GIRDWELL_DEMO: z.enum(['on', 'off']).default('on'),
  GIRDWELL_ADMIN_EMAIL: z.string().trim().toLowerCase().pipe(z.email()).nullable().default(null),
  GIRDWELL_LOG: z.enum(logLevels).default('warn'),
  GIRDWELL_SOLVER_SECONDS: z.coerce.number().min(1).max(600).default(20),
})

export function readConfig(environment: Record<string, string | undefined>): Config {
  // A variable set to nothing is a variable not set.
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value?.trim()))
  const read = environmentSchema.safeParse(given)
  if (!read.success) {
    const [issue] = read.error.issues
    const name = String(issue.path[0])
    throw new StartError(`${name} is "${given[name]}": ${issue.message}.`)
  }
  const values = read.data
  return {
    host: values.HOST,
    port: values.PORT,
    dataFolder: resolve(values.GIRDWELL_DATA),
    publicUrl: values.GIRDWELL_PUBLIC_URL,
    trustedProxies: values.GIRDWELL_TRUSTED_PROXIES,
    demo: values.GIRDWELL_DEMO === 'on',
    adminEmail: values.GIRDWELL_ADMIN_EMAIL,
    logLevel: values.GIRDWELL_LOG,
    solverTimeLimit: values.GIRDWELL_SOLVER_SECONDS * 1000,
  }
}

/** Whether only this machine can reach a server that listens there. */
export function isLoopback(host: string): boolean {
  const name = host.toLowerCase().replace(/^\[|\]$/g, '')
  return name === 'localhost' || name === '::1' || /^127(\.\d{1,3}){3}$/.test(name)
}
