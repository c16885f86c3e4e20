import type { RequestHandler } from 'express'
import { crossSiteRequest } from './errors.ts'

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses changes that another site's page sends with our cookie. Browsers say where a request comes from in
 * `Sec-Fetch-Site` (on https and loopback) and in `Origin`; a request with neither is no browser's.
 */
export function refuseCrossSite(appUrl: string): RequestHandler {
  const appOrigin = new URL(appUrl).origin
  return (req, _res, next) => {
    if (safeMethods.has(req.method)) return next()
    const site = req.get('Sec-Fetch-Site')
    if (site !== undefined) {
      if (site === 'same-origin' || site === 'none') return next()
      throw crossSiteRequest()
    }
    const origin = req.get('Origin')
    if (origin !== undefined && origin !== appOrigin && !sameHost(origin, req.get('Host'))) {
      throw crossSiteRequest()
    }
    next()
  }
}

function sameHost(origin: string, host: string | undefined): boolean {
  try {
    return new URL(origin).host === host
  } catch {
    return false // 'null', as sandboxed pages send it
  }
}
