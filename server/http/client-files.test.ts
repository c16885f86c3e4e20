import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import express from 'express'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { builtClient } from './client-files.ts'

const folder = mkdtempSync(join(tmpdir(), 'underfoot-client-'))
const app = express().use(builtClient(folder))

beforeAll(() => {
  mkdirSync(join(folder, 'assets'))
  writeFileSync(join(folder, 'index.html'), '<title>Underfoot</title>')
  writeFileSync(join(folder, 'assets/app-1a2b.js'), 'go()')
})
afterAll(() => rmSync(folder, { recursive: true }))

describe('the built client', () => {
  it('is kept by browsers for good where the name holds a hash of the content', async () => {
    const { headers } = await request(app).get('/assets/app-1a2b.js')
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable')
  })

  it.each(['/', '/sessions', '/trials/1234'])(
    'answers %s with the application, asked for anew each time',
    async (path) => {
      const { text, headers } = await request(app).get(path)
      expect(text).toContain('<title>Underfoot</title>')
      expect(headers['cache-control']).toBe('no-cache')
    },
  )

  it('answers a file that is not there with 404, and not with the application', async () => {
    expect((await request(app).get('/assets/app-old.js')).status).toBe(404)
    expect((await request(app).get('/robots.txt')).status).toBe(404)
  })

  it('keeps to its folder', async () => {
    const { status, text } = await request(app).get('/..%2f..%2f..%2fetc%2fpasswd')
    expect(status).not.toBe(500)
    expect(text).not.toContain('root:')
  })
})
