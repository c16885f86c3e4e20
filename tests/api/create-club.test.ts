import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { acceptInvitation } from '../../shared/contracts/account.ts'
import { getSeats } from '../../shared/contracts/clubs.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
beforeAll(async () => {
  harness = await startHarness()
  harness.time.now = new Date()
})
afterAll(() => harness.stop())

const run = promisify(execFile)
const environment = () => ({
  PATH: process.env.PATH,
  DATABASE_WEB_URL: harness.database.webUrl,
  APP_URL: 'https://underfoot.example.org',
})
const createClub = (...args: string[]) =>
  run(process.execPath, ['--import', 'tsx', 'server/commands/create-club.ts', ...args], {
    env: environment(),
  })

describe('the command that makes a club', () => {
  it('prints a link by which its first admin gets in', async () => {
    const { stdout } = await createClub(
      ...['--name', 'Harbour Club', '--admin-email', 'First@Example.org', '--admin-name', 'First Admin'],
      ...['--time-zone', 'Europe/Lisbon', '--seats', '30'],
    )
    const token = /https:\/\/underfoot\.example\.org\/invite\/([\w-]+)/.exec(stdout)?.[1] ?? ''
    const admin = harness.client()
    const body = { name: 'First Admin', password: 'the first of passwords' }
    const me = await admin.call(acceptInvitation, { params: { token }, body })
    expect(me).toMatchObject({
      person: { email: 'first@example.org' },
      club: { name: 'Harbour Club', timeZone: 'Europe/Lisbon', demo: false },
      roles: ['admin'],
    })
    expect(await admin.call(getSeats)).toEqual({ used: 0, paid: 30, staff: 1 })
  })

  it('says what it needs when something is missing, wrong or unknown, and makes nothing', async () => {
    const rest = ['--admin-email', 'a@example.org', '--admin-name', 'A']
    const cases: [string[], RegExp][] = [
      [['--name', 'No Admin Club'], /--admin-email/],
      [['--name', 'x', ...rest, '--time-zone', 'Mars/Crater'], /IANA/],
      [['--name', 'x', ...rest, '--colour', 'green'], /colour/],
    ]
    await Promise.all(cases.map(([args, words]) => expect(createClub(...args)).rejects.toThrow(words)))
    const { rows } = await harness.db.inIdentity((tx) => tx.execute('select name from identity.clubs'))
    expect(rows).toEqual([{ name: 'Harbour Club' }])
  })
})

describe('the mail catcher’s process', () => {
  it('refuses to start in production', async () => {
    const env = { PATH: process.env.PATH, NODE_ENV: 'production' }
    const starting = run(process.execPath, ['--import', 'tsx', 'server/fakes/main.ts'], { env })
    await expect(starting).rejects.toMatchObject({
      code: 1,
      stdout: expect.stringContaining('never caught') as string,
    })
  })
})
