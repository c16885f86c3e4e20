import { existsSync } from 'node:fs'
import { resolve } from 'node:path'
import express, { Router } from 'express'
import type { Config } from '../config/config.ts'

const builtClient = resolve('dist/client')
const indexFile = resolve(builtClient, 'index.html')
const yearMs = 365 * 24 * 3600 * 1000

/** The client: hashed files cached for good, and index.html, always asked for anew, for every path of the app. */
export async function clientFiles({ client }: Pick<Config, 'client'>): Promise<Router> {
  return client === 'vite' ? viteClient() : builtClientFiles()
}

function builtClientFiles(): Router {
  const router = Router()
  router.use('/assets', express.static(resolve(builtClient, 'assets'), { immutable: true, maxAge: yearMs }))
  router.use(express.static(builtClient, { index: false, maxAge: '1h' }))
  router.get('/{*path}', (req, res, next) => {
    // A missing file is a 404, not the application.
    if (/\.\w+$/.test(req.path) || !existsSync(indexFile)) return next()
    res.set('Cache-Control', 'no-cache').sendFile(indexFile)
  })
  return router
}

async function viteClient(): Promise<Router> {
  const { createServer } = await import('vite')
  const vite = await createServer({ server: { middlewareMode: true }, appType: 'spa' })
  const router = Router()
  router.use(vite.middlewares)
  return router
}
