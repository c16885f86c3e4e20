import { existsSync } from 'node:fs'
import type { Server } from 'node:http'
import { resolve } from 'node:path'
import express, { Router } from 'express'
import type { Config } from '../config/config.ts'

const yearMs = 365 * 24 * 3600 * 1000

/** The client: hashed files cached for good, and index.html, always asked for anew, for every path of the app. */
export async function clientFiles(
  { client }: Pick<Config, 'client'>,
  server: Server | undefined,
): Promise<Router> {
  return client === 'vite' ? viteClient(server) : builtClient(resolve('dist/client'))
}

export function builtClient(folder: string): Router {
  const indexFile = resolve(folder, 'index.html')
  const router = Router()
  router.use('/assets', express.static(resolve(folder, 'assets'), { immutable: true, maxAge: yearMs }))
  router.use(express.static(folder, { index: false, maxAge: '1h' }))
  router.get('/{*path}', (req, res, next) => {
    // A missing file is a 404, not the application.
    if (/\.\w+$/.test(req.path) || !existsSync(indexFile)) return next()
    res.set('Cache-Control', 'no-cache').sendFile(indexFile)
  })
  return router
}

/** Vite tells the browser of changes over our own server, so that two checkouts can run side by side. */
async function viteClient(server: Server | undefined): Promise<Router> {
  const { createServer } = await import('vite')
  const vite = await createServer({ server: { middlewareMode: true, ws: { server } }, appType: 'spa' })
  const router = Router()
  router.use(vite.middlewares)
  return router
}
