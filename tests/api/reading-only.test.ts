import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { endpoints } from '../../shared/contracts/all-endpoints.ts'
import { roles, type Role } from '../../shared/contracts/roles.ts'
import { workerContext } from '../../server/db/database.ts'
import { standings } from '../../server/db/schema/billing.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { accessTable } from './harness/access-table.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { buildOneOfEach, type OneOfEach } from './harness/one-of-each.ts'

let harness: Harness
let own: OneOfEach
const callers = new Map<Role, ApiClient>()

beforeAll(async () => {
  harness = await startHarness()
  own = await buildOneOfEach(harness)
  for (const role of roles) {
    callers.set(role, await harness.signedIn(await buildMember(harness.db, own.clubId, [role])))
  }
  await readsOnlyFrom(new Date(harness.time.now.getTime() - 1))
})
afterAll(() => harness.stop())

const readsOnlyFrom = (at: Date) =>
  harness.db.inClub(workerContext(own.clubId), (tx) =>
    tx
      .insert(standings)
      .values({ clubId: own.clubId, readsOnlyFrom: at })
      .onConflictDoUpdate({ target: standings.clubId, set: { readsOnlyFrom: at } }),
  )

/** What stays open to a lapsed club besides reading, written down a second time. */
const stillOpen = new Set([
  'changePassword',
  'startCheckout',
  'changeSeats',
  'endSubscription',
  'openPortal',
  'refreshBilling',
])

describe('a club that only reads', () => {
  it.each(Object.entries(accessTable))(
    'is answered at %s as it should be',
    async (name, { may, request }) => {
      const endpoint = endpoints[name]
      if (!endpoint || may === 'anybody') return expect(endpoint?.access).toBe('public')
      const reads = endpoint.method === 'GET' || stillOpen.has(name)
      for (const role of roles) {
        const { code, status } = (await callers.get(role)?.glance(endpoint, request(own))) ?? {}
        const mayCall = may === 'members' || may.includes(role)
        if (!mayCall) expect([role, code]).toEqual([role, 'not-allowed'])
        else if (reads)
          expect([role, code === 'club-reads-only', (status ?? 500) < 500]).toEqual([role, false, true])
        else expect([role, code, status]).toEqual([role, 'club-reads-only', 402])
      }
    },
  )

  it('writes until the very moment, and has lost nothing after it', async () => {
    const coach = callers.get('coach')
    const { createSquad, listSquads } = endpoints
    if (!coach || !createSquad || !listSquads) throw new Error('no coach, or no squads')
    const make = (name: string) => coach.send(createSquad, { body: { name, athleteIds: [] } })
    await readsOnlyFrom(new Date(harness.time.now.getTime() + 1))
    await make('In time').expect(200)
    harness.time.now = new Date(harness.time.now.getTime() + 1)
    await make('Too late').expect(402)
    expect((await coach.send(listSquads)).text).toContain('In time')
    await harness.db.inClub(workerContext(own.clubId), (tx) =>
      tx.update(standings).set({ readsOnlyFrom: null }).where(eq(standings.clubId, own.clubId)),
    )
    await make('Too late').expect(200)
  })
})
