import helmet from 'helmet'
import type { RequestHandler } from 'express'
import type { Config } from '../config/config.ts'

/**
 * Everything from our own origin and nothing inline. Vite's development server alone needs its inline
 * preamble, and a socket for reloading.
 */
export function securityHeaders({ client, mode }: Pick<Config, 'client' | 'mode'>): RequestHandler {
  const vite = client === 'vite'
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        scriptSrc: vite ? ["'self'", "'unsafe-inline'"] : ["'self'"],
        styleSrc: vite ? ["'self'", "'unsafe-inline'"] : ["'self'"],
        imgSrc: ["'self'", 'data:'],
        fontSrc: ["'self'"],
        connectSrc: vite ? ["'self'", 'ws:'] : ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        baseUri: ["'none'"],
      },
    },
    strictTransportSecurity: mode === 'production' ? { maxAge: 31_536_000 } : false,
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'no-referrer' },
    xFrameOptions: { action: 'deny' },
  })
}
