import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { acceptInvitation } from '../../shared/contracts/account.ts'
import { getBilling } from '../../shared/contracts/billing.ts'
import { getSeats } from '../../shared/contracts/clubs.ts'
import { createSquad } from '../../shared/contracts/squads.ts'
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

  it('makes a club on trial, which writes until the trial is over', async () => {
    const { stdout } = await createClub(
      ...[
        '--name',
        'Trial Club',
        '--admin-email',
        'trial@example.org',
        '--admin-name',
        'On Trial',
        '--trial',
      ],
    )
    const token = /invite\/([\w-]+)/.exec(stdout)?.[1] ?? ''
    const admin = harness.client()
    await admin.call(acceptInvitation, {
      params: { token },
      body: { name: 'A', password: 'the first of passwords' },
    })
    expect(await admin.call(getSeats)).toMatchObject({ paid: 40 })
    expect(await admin.call(getBilling)).toMatchObject({ state: 'trial', readsOnly: false })
    const squad = { body: { name: 'Squad', athleteIds: [] } }
    const before = harness.time.now
    harness.time.now = new Date(before.getTime() + 30 * 24 * 3600 * 1000 + 60_000)
    expect(await admin.refusal(createSquad, squad)).toEqual([402, 'club-reads-only'])
    harness.time.now = before
    await admin.call(createSquad, squad)
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
    expect(rows).toEqual([{ name: 'Harbour Club' }, { name: 'Trial Club' }])
  })
})

describe.each([
  ['the mail catcher', 'server/fakes/main.ts', 'never caught'],
  ['the local payment service', 'server/fakes/payments/main.ts', 'never runs there'],
])('the process of %s', (_, file, words) => {
  it('refuses to start in production', async () => {
    const env = { PATH: process.env.PATH, NODE_ENV: 'production' }
    const starting = run(process.execPath, ['--import', 'tsx', file], { env })
    await expect(starting).rejects.toMatchObject({
      code: 1,
      stdout: expect.stringContaining(words) as string,
    })
  })
})
