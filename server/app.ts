import compression from 'compression'
import express, { Router, type Express } from 'express'
import { checkOrigin } from './auth/origin.ts'
import { identify } from './auth/identify.ts'
import { isSecure, type Context } from './context.ts'
import { apiNotFound, errorHandler } from './errors.ts'
import { findClientFolder } from './folders.ts'
import { linkLimit, passwordLimits, signInLimits } from './limits.ts'
import { logRequests } from './log.ts'
import { clientFiles } from './routes/clientFiles.ts'
import { accountRoutes } from './routes/account.ts'
import { healthRoutes } from './routes/health.ts'
import { jobRoutes } from './routes/jobs.ts'
import { linkRoutes, visitorRoutes } from './routes/links.ts'
import { sectionRoutes } from './routes/sections.ts'
import { sheetRoutes } from './routes/sheets.ts'
import { userRoutes } from './routes/users.ts'
import { forApi, forLinks, securityHeaders } from './securityHeaders.ts'

/** The application without a port, so that tests run it as it is. */
export function createApp(context: Context, clientFolder: string | null = findClientFolder()): Express {
  const { config } = context
  const app = express()
  app.disable('x-powered-by')
  app.set('etag', false)
  app.set('trust proxy', config.trustedProxies)
  app.use(logRequests(context.log))
  app.use(securityHeaders(isSecure(config)))
  app.use('/api', forApi)
  app.use(['/link', '/api/link'], forLinks)
  app.use(compression())
  app.use('/api', apiRoutes(context))
  if (clientFolder !== null) app.use(clientFiles(clientFolder))
  app.use(errorHandler)
  return app
}

function apiRoutes(context: Context): Router {
  const api = Router()
  // Order matters: a foreign page is refused before anything is read, and the body is read before it is counted.
  api.use(checkOrigin(context.config.publicUrl))
  api.use(healthRoutes(context))
  api.use(visitorRoutes(context, linkLimit()))
  api.use(express.json({ limit: '2mb' }))
  api.use(identify(context.sessions))
  api.use(accountRoutes(context, { signIn: signInLimits(), password: passwordLimits() }))
  api.use(userRoutes(context))
  api.use(jobRoutes(context))
  api.use(sectionRoutes(context))
  api.use(sheetRoutes(context))
  api.use(linkRoutes(context))
  api.use(apiNotFound)
  return api
}
