import express, { Router } from 'express'

/** The built page and its assets; every other address is the page's own to route. */
export function clientFiles(folder: string): Router {
  const router = Router()

  // Names carry a hash of the content. A missing one is a 404: index.html in its place would fail as a script.
  router.use(
    '/assets',
    express.static(`${folder}/assets`, { immutable: true, maxAge: '1y', fallthrough: false, index: false }),
  )
  router.use(express.static(folder, { index: false, maxAge: '1h' }))

  router.get('/{*path}', (_request, response, next) => {
    const cache = response.getHeader('Cache-Control') ?? 'no-cache'
    response.setHeader('Cache-Control', cache)
    response.sendFile('index.html', { root: folder, cacheControl: false }, (failure) => {
      if (failure) next(failure)
    })
  })

  return router
}
