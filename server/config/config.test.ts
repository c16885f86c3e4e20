import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { ConfigProblem, loadConfig } from './config.ts'
import { envExample } from './env-example.ts'

const webUrl = 'postgresql://web@127.0.0.1/underfoot'
const production = {
  NODE_ENV: 'production',
  DATABASE_WEB_URL: webUrl,
  DATABASE_WORKER_URL: 'postgresql://worker@127.0.0.1/underfoot',
  DATABASE_OWNER_URL: 'postgresql://owner@127.0.0.1/underfoot',
  SESSION_SECRET: 'x'.repeat(40),
  SMTP_URL: 'smtp://mail.example.org',
  APP_URL: 'https://underfoot.example.org/',
  TRUSTED_PROXIES: '1',
}

describe('configuration', () => {
  it('needs nothing but the address of the database in development', () => {
    const config = loadConfig('web', { DATABASE_WEB_URL: webUrl, PORT: '' })
    expect(config).toMatchObject({ mode: 'development', port: 3000, databaseUrl: webUrl })
  })

  it('gives each process the database address of its own role', () => {
    const environment = { DATABASE_WEB_URL: webUrl, DATABASE_WORKER_URL: 'postgresql://worker@127.0.0.1/u' }
    expect(loadConfig('worker', environment).databaseUrl).toContain('worker@')
    expect(() => loadConfig('owner', environment)).toThrow(/DATABASE_OWNER_URL is not set/)
  })

  it('names every setting that it cannot read', () => {
    const wrong = () => loadConfig('web', { PORT: '70000', LOG_LEVEL: 'loud' })
    expect(wrong).toThrow(ConfigProblem)
    expect(wrong).toThrow(/LOG_LEVEL[\s\S]*PORT/)
  })

  it('takes a complete production environment, without the last slash of the address', () => {
    expect(loadConfig('web', production).appUrl).toBe('https://underfoot.example.org')
  })

  it.each([
    ['web', 'SESSION_SECRET', ''],
    ['web', 'SESSION_SECRET', 'short'],
    ['web', 'APP_URL', 'http://underfoot.example.org'],
    ['web', 'CLIENT', 'vite'],
    ['web', 'TRUSTED_PROXIES', '0'],
    ['worker', 'SMTP_URL', ''],
    ['worker', 'APP_URL', 'http://underfoot.example.org'],
  ] as const)('refuses to start the %s process in production with %s=%j', (role, name, value) => {
    expect(() => loadConfig(role, { ...production, [name]: value })).toThrow(name)
  })

  it('lets the owner migrate with nothing but the address of the database', () => {
    const { NODE_ENV, DATABASE_OWNER_URL } = production
    expect(loadConfig('owner', { NODE_ENV, DATABASE_OWNER_URL }).mode).toBe('production')
  })

  it('is written down in .env.example as it stands in the code', () => {
    expect(readFileSync('.env.example', 'utf8')).toBe(envExample())
  })
})
