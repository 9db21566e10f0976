import { resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { isLoopback, readConfig } from '#server/config.ts'
import { StartError } from '#server/startError.ts'

describe('the configuration', () => {
  it('is for this machine alone when nothing is set', () => {
    expect(readConfig({})).toEqual({
      host: '127.0.0.1',
      port: 4780,
      dataFolder: resolve('data'),
      publicUrl: null,
      trustedProxies: 0,
      demo: true,
      adminEmail: null,
      logLevel: 'warn',
      solverTimeLimit: 20_000,
    })
    expect(readConfig({ PORT: '', HOST: ' ' })).toEqual(readConfig({}))
  })

  it('reads what is set', () => {
    const config = readConfig({
      HOST: '0.0.0.0',
      PORT: '8080',
      GIRDWELL_PUBLIC_URL: 'https://columns.office.test',
      GIRDWELL_DEMO: 'off',
      GIRDWELL_ADMIN_EMAIL: ' Lena@Office.test',
      GIRDWELL_TRUSTED_PROXIES: '1',
    })
    expect(config).toMatchObject({ host: '0.0.0.0', port: 8080, demo: false, trustedProxies: 1 })
    expect(config.publicUrl?.origin).toBe('https://columns.office.test')
    expect(config.adminEmail).toBe('lena@office.test')
  })

  it.each([
    ['PORT', 'eighty'],
    ['PORT', '70000'],
    ['GIRDWELL_DEMO', 'no'],
    ['GIRDWELL_PUBLIC_URL', 'columns.office.test'],
    ['GIRDWELL_PUBLIC_URL', 'ftp://columns.office.test'],
    ['GIRDWELL_ADMIN_EMAIL', 'lena'],
  ])('says of %s = %s what was found', (name, value) => {
    expect(() => readConfig({ [name]: value })).toThrow(StartError)
    expect(() => readConfig({ [name]: value })).toThrow(`${name} is "${value}"`)
  })
})

describe('a host', () => {
  it.each(['127.0.0.1', '127.1.2.3', 'localhost', 'LOCALHOST', '::1', '[::1]'])(
    '%s is this machine',
    (host) => {
      expect(isLoopback(host)).toBe(true)
    },
  )

  it.each(['0.0.0.0', '::', '192.168.1.4', '127.0.0.1.elsewhere.test', 'office.test', '1270.0.0.1'])(
    '%s can be reached by others',
    (host) => {
      expect(isLoopback(host)).toBe(false)
    },
  )
})
