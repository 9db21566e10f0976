import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { newJobSchema } from '#shared/api.ts'
import { ApiError, apiClient, findFormIssues, whenSignedOut } from '@/clients/apiClient.ts'

type Reply = Response | Error | DOMException

/** What the network does, call after call. */
function network(...replies: Reply[]) {
  const fetch = vi.fn<(path: string, init: RequestInit) => Promise<Response>>(() => {
    const reply = replies.shift()
    if (reply === undefined) throw new Error('The test foresaw no further call')
    return reply instanceof Response ? Promise.resolve(reply) : Promise.reject(reply)
  })
  vi.stubGlobal('fetch', fetch)
  return fetch
}

const json = (status: number, body: unknown) => new Response(JSON.stringify(body), { status })
const fault = (status: number, code: string, more: object = {}) =>
  json(status, { error: { code, message: `said ${code}`, requestId: 'r-7', ...more } })
const cut = () => new TypeError('failed to fetch')
const late = () => new DOMException('signal timed out', 'TimeoutError')

async function failureOf(work: Promise<unknown>): Promise<ApiError> {
  return work.then(
    () => {
      throw new Error('It should have failed')
    },
    (error: unknown) => {
      if (error instanceof ApiError) return error
      throw error
    },
  )
}

beforeEach(() => vi.useFakeTimers())
afterEach(() => {
  vi.useRealTimers()
  vi.unstubAllGlobals()
})

describe('what is sent', () => {
  it('names the revision that a write is based on, as an entity tag', async () => {
    const fetch = network(json(200, {}))
    await apiClient.patchJob('j1', 3, { title: 'Tern Creek', number: '' })
    const [path, init] = fetch.mock.calls[0]
    expect(path).toBe('/api/jobs/j1')
    // RFC 9110 section 8.8.3: an entity tag is a quoted string.
    expect(init.headers).toMatchObject({ 'if-match': '"3"', 'content-type': 'application/json' })
    expect(init).toMatchObject({ method: 'PATCH', credentials: 'same-origin' })
    expect(JSON.parse(String(init.body))).toEqual({ title: 'Tern Creek', number: '' })
  })

  it('reads without a body and without a revision', async () => {
    const fetch = network(json(200, {}))
    await apiClient.getJob('j1')
    expect(fetch.mock.calls[0][1].body).toBeUndefined()
    expect(Object.keys(fetch.mock.calls[0][1].headers as object)).toEqual(['accept'])
  })

  it('fetches a list to its last page', async () => {
    const fetch = network(
      json(200, { items: [1, 2], nextCursor: 'a/b' }),
      json(200, { items: [3], nextCursor: null }),
    )
    expect(await apiClient.listJobs()).toEqual([1, 2, 3])
    expect(fetch.mock.calls.map(([path]) => path)).toEqual([
      '/api/jobs?limit=200',
      '/api/jobs?limit=200&cursor=a%2Fb',
    ])
  })
})

describe('what comes back', () => {
  it('no content is no failure', async () => {
    network(new Response(null, { status: 204 }))
    expect(await apiClient.signOut()).toBeUndefined()
  })

  it.each([
    [400, 'invalid', { issues: [{ path: 'title', code: 'too-small', message: 'Give it a name' }] }],
    [403, 'forbidden', {}],
    [404, 'not-found', {}],
    [409, 'conflict', { stored: { revision: 5 } }],
    [410, 'link-ended', { ended: 'revoked' }],
    [429, 'too-many-tries', {}],
    [500, 'internal', {}],
  ] as const)('%i %s becomes an error that the page decides by', async (status, code, more) => {
    network(fault(status, code, more))
    const error = await failureOf(apiClient.getJob('j1'))
    expect(error).toMatchObject({ status, code, message: `said ${code}`, requestId: 'r-7', ...more })
  })

  it('has the sentence for one field, with what is allowed', async () => {
    const issues = [
      { path: 'section.spirals[0].pitch', code: 'range', message: 'found 0 mm', allowed: '1 to 10000 mm' },
    ]
    network(fault(400, 'invalid', { issues }))
    const error = await failureOf(apiClient.getJob('j1'))
    expect(error.issueAt('section.spirals[0].pitch')).toBe('found 0 mm, allowed 1 to 10000 mm')
    expect(error.issueAt('title')).toBeUndefined()
  })

  it.each([
    ['a page of a gateway', new Response('<h1>Bad gateway</h1>', { status: 502 }), 502],
    ['JSON of somebody else', json(503, { message: 'try later' }), 503],
    ['nothing at all', new Response('', { status: 200 }), 200],
    ['null', json(500, null), 500],
  ])('%s is told as no answer of ours', async (_what, response, status) => {
    network(response)
    const error = await failureOf(apiClient.getJob('j1'))
    expect(error).toMatchObject({ code: 'unreadable', status })
    expect(error.message).toContain(`status ${status}`)
  })

  it('an answer that breaks off is a lost connection', async () => {
    const body = new ReadableStream({ start: (stream) => stream.error(new TypeError('network error')) })
    network(new Response(body, { status: 200 }))
    expect((await failureOf(apiClient.getJob('j1'))).code).toBe('unreachable')
  })

  it('tells whoever listens that nobody is signed in any more, but not when that was the question', async () => {
    const told = vi.fn()
    whenSignedOut(told)
    network(fault(401, 'not-signed-in'), fault(401, 'not-signed-in'), fault(401, 'wrong-credentials'))
    await failureOf(apiClient.getSession())
    expect(told).not.toHaveBeenCalled()
    await failureOf(apiClient.getJob('j1'))
    expect(told).toHaveBeenCalledOnce()
    await failureOf(apiClient.signIn({ email: 'rosa@demo.girdwell.invalid', password: 'x' }))
    expect(told).toHaveBeenCalledOnce()
  })
})

describe('a server out of reach', () => {
  it('is read from once more after a moment', async () => {
    const fetch = network(cut(), json(200, { id: 'j1' }))
    const reading = apiClient.getJob('j1')
    await vi.advanceTimersByTimeAsync(1000)
    expect(await reading).toEqual({ id: 'j1' })
    expect(fetch).toHaveBeenCalledTimes(2)
  })

  it('is told after the second time', async () => {
    const fetch = network(cut(), cut())
    const reading = failureOf(apiClient.getJob('j1'))
    await vi.advanceTimersByTimeAsync(1000)
    const error = await reading
    expect(error.code).toBe('unreachable')
    expect(error.message).toBe('The server cannot be reached. Try again when the connection is back.')
    expect(fetch).toHaveBeenCalledTimes(2)
  })

  it('is never written to twice without being asked', async () => {
    const fetch = network(cut())
    const error = await failureOf(apiClient.signIn({ email: 'rosa@demo.girdwell.invalid', password: 'x' }))
    expect(error.message).toContain('What you typed is kept')
    expect(fetch).toHaveBeenCalledOnce()
  })

  it('is not waited for a second time when it was too slow', async () => {
    const fetch = network(late())
    const error = await failureOf(apiClient.getJob('j1'))
    expect(error.code).toBe('unreachable')
    expect(error.message).toContain('took too long to answer')
    expect(fetch).toHaveBeenCalledOnce()
  })
})

describe('ApiError', () => {
  it('keeps the cause of a fault of our own', () => {
    const cause = new Error('undefined is not a function')
    const error = ApiError.from(cause)
    expect(error.code).toBe('unreadable')
    expect(error.cause).toBe(cause)
    expect(ApiError.from(error)).toBe(error)
  })

  it('form issues name the field before anything is sent', () => {
    const id = '3b0b0d1e-52a8-4f0b-9d58-0c8d2a4f1b01'
    expect(findFormIssues(newJobSchema, { id, title: '  ', number: '' })).toEqual([
      { path: 'title', code: 'invalid', message: 'Give it a name' },
    ])
    expect(findFormIssues(newJobSchema, { id, title: 'Tern Creek', number: '' })).toEqual([])
  })
})
