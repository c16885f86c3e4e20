import { describe, expect, it } from 'vitest'
import { readSettings } from './settings.mjs'

const urls = { DATABASE_OWNER_URL: 'postgresql://o', DATABASE_WEB_URL: 'postgresql://w' }

describe('the settings of a start', () => {
  it('need nothing from the environment', () => {
    const settings = readSettings({})
    expect(settings).toMatchObject({ port: 3000, appUrl: 'http://localhost:3000', production: false })
    expect(settings.database).toBeUndefined()
  })

  it('take a database of the operator’s own by its three addresses', () => {
    const { database } = readSettings({ ...urls, DATABASE_WORKER_URL: 'postgresql://k' })
    expect(database).toEqual({ owner: 'postgresql://o', web: 'postgresql://w', worker: 'postgresql://k' })
  })

  it('name the address that is missing of a database of the operator’s own', () => {
    expect(() => readSettings(urls)).toThrow(/^DATABASE_WORKER_URL is not set/)
  })

  it.each(['0', '70000', 'http', '3000.5'])('refuse %s as a port', (port) => {
    expect(() => readSettings({ PORT: port })).toThrow(`PORT is "${port}"`)
  })

  it('refuse to catch mail in production', () => {
    expect(() => readSettings({ NODE_ENV: 'production' })).toThrow(/set SMTP_URL/)
  })
})
