import type { RequestHandler } from 'express'
import helmet from 'helmet'

/** `secure`: people reach the server through TLS. */
export function securityHeaders(secure: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        // Vuetify writes its theme into a style element.
        styleSrc: ["'self'", "'unsafe-inline'"],
        fontSrc: ["'self'", 'data:'],
        imgSrc: ["'self'", 'data:', 'blob:'],
        workerSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        // Over plain http this would send every request to a port that answers nothing.
        upgradeInsecureRequests: secure ? [] : null,
      },
    },
    strictTransportSecurity: secure,
    // These two need TLS or localhost to mean anything; elsewhere browsers only complain about them.
    crossOriginOpenerPolicy: secure,
    originAgentCluster: secure,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  })
}

/** Answers are about one person at one moment. */
export const forApi: RequestHandler = (_request, response, next) => {
  response.setHeader('Cache-Control', 'no-store')
  response.setHeader('X-Robots-Tag', 'noindex')
  next()
}

/** The address of a link is its key: it must not be indexed, passed on as a referrer, or left in a cache. */
export const forLinks: RequestHandler = (_request, response, next) => {
  response.setHeader('X-Robots-Tag', 'noindex, nofollow, noarchive')
  response.setHeader('Referrer-Policy', 'no-referrer')
  response.setHeader('Cache-Control', 'no-store')
  next()
}
