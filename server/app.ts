import compression from 'compression'
import express, { Router, type Express } from 'express'
import type { Server } from 'node:http'
import { takePaymentEvent } from '../shared/contracts/billing.ts'
import type { Deps } from './deps.ts'
import { clientFiles } from './http/client-files.ts'
import { refuseCrossSite } from './http/cross-site.ts'
import { answerError, answerNotFound } from './http/error-response.ts'
import { healthRoutes } from './http/health.ts'
import type { Route } from './http/implement.ts'
import { requestLog } from './http/request-log.ts'
import { securityHeaders } from './http/security-headers.ts'
import { signInSession } from './http/sign-in-session.ts'
import { passport } from './modules/account/passport.ts'
import { routes } from './routes.ts'

/**
 * The web application, from what it is given: nothing of it lives outside `deps`. `server` is what will serve it,
 * which only Vite in development needs to know.
 */
export async function createApp(deps: Deps, server?: Server): Promise<Express> {
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', deps.config.trustedProxies)
  app.locals.deps = deps
  app.use(requestLog(deps.log))
  app.use(securityHeaders(deps.config))
  app.use(healthRoutes(deps))
  app.use(compression())
  app.use('/api', api(deps))
  app.use(await clientFiles(deps.config, server))
  app.use(answerNotFound)
  app.use(answerError)
  return app
}

function api(deps: Deps): Router {
  const router = Router()
  router.use((_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  router.use(refuseCrossSite(deps.config.appUrl))
  // What is signed is taken as the bytes that came.
  router.use(takePaymentEvent.path.replace(/^\/api/, ''), express.raw({ type: () => true, limit: '512kb' }))
  router.use(express.json({ limit: '256kb' }))
  router.use(signInSession(deps))
  router.use(passport.session())
  for (const route of routes) mount(router, route, deps)
  router.use(answerNotFound)
  return router
}

const verbs = { GET: 'get', POST: 'post', PATCH: 'patch', PUT: 'put', DELETE: 'delete' } as const

function mount(router: Router, { endpoint, handler }: Route, deps: Deps): void {
  router[verbs[endpoint.method]](endpoint.path.replace(/^\/api/, ''), handler(deps))
}
