import { randomUUID } from 'node:crypto'
import compression from 'compression'
import cookieParser from 'cookie-parser'
import express, { type Express } from 'express'
import { API_PREFIX } from '@/shared/api/defineEndpoint'
import type { Context } from './context'
import { authenticate } from './middleware/authenticate'
import { answerProblem, unknownAddress } from './middleware/problems'
import { securityHeaders } from './middleware/securityHeaders'
import { allRoutes } from './routes/allRoutes'
import { devMailRoutes } from './routes/devMail/devMailRoutes'
import { serveWeb } from './routes/serveWeb'

/** The Express app without listening: what main.ts serves and what tests drive. */
export function createApp(context: Context): Express {
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', context.config.trustedProxies)
  app.set('query parser', 'simple')
  app.use((request, response, next) => {
    request.requestId = randomUUID()
    response.set('X-Request-Id', request.requestId)
    next()
  })
  app.use(securityHeaders(context.config))

  const api = express.Router()
  api.use((_request, response, next) => {
    response.set('Cache-Control', 'no-store')
    next()
  })
  api.use(compression())
  api.use(cookieParser())
  api.use(express.json({ limit: '2mb', strict: true }))
  api.use(authenticate(context))
  for (const routes of allRoutes) api.use(routes(context))
  api.use(unknownAddress)

  app.use([API_PREFIX, '/api'], api)
  if (context.config.hasDevMail) app.use('/dev/mail', devMailRoutes(context))
  app.use(serveWeb(context))
  app.use(answerProblem(context.log))
  return app
}
