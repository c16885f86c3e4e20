import { and, eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { endpoints } from '../../shared/contracts/all-endpoints.ts'
import { roles, type Role } from '../../shared/contracts/roles.ts'
import { routes } from '../../server/routes.ts'
import { memberships } from '../../server/db/schema/identity.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { accessTable, type AccessLine } from './harness/access-table.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { buildOneOfEach, type OneOfEach } from './harness/one-of-each.ts'

/** Callers of each role of the club, each role of another club, one signed out, one deactivated since signing in. */
type Where = 'own club' | 'other club'
type CallerName = `${Role}, ${Where}` | 'signed out' | 'deactivated'
/** What the walk tells apart; anything else is told with its status. */
type Outcome = 'answered' | 'not-found' | 'invalid' | 'not-allowed' | 'not-signed-in' | `leaks ${string}`

const places: Where[] = ['own club', 'other club']
const callerNames: CallerName[] = [
  ...places.flatMap((where) => roles.map((role) => `${role}, ${where}` as const)),
  'signed out',
  'deactivated',
]
let harness: Harness
let own: OneOfEach
const callers = new Map<CallerName, ApiClient>()

beforeAll(async () => {
  harness = await startHarness()
  own = await buildOneOfEach(harness)
  const other = await buildOneOfEach(harness)
  for (const where of places) {
    for (const role of roles) {
      const { clubId } = where === 'own club' ? own : other
      const member = await buildMember(harness.db, clubId, [role])
      callers.set(`${role}, ${where}`, await harness.signedIn(member))
    }
  }
  callers.set('signed out', harness.client())
  callers.set('deactivated', await deactivatedSinceSignIn())
})
afterAll(() => harness.stop())

async function deactivatedSinceSignIn(): Promise<ApiClient> {
  const member = await buildMember(harness.db, own.clubId, roles)
  const browser = await harness.signedIn(member)
  await harness.db.inIdentity((tx) =>
    tx
      .update(memberships)
      .set({ active: false })
      .where(and(eq(memberships.clubId, own.clubId), eq(memberships.personId, member.id))),
  )
  return browser
}

function expected({ may, elsewhere, notTheirs, notTheirsToChange }: AccessLine, caller: CallerName): Outcome {
  if (may === 'anybody') return 'answered'
  if (caller === 'signed out' || caller === 'deactivated') return 'not-signed-in'
  const [role, where] = caller.split(', ') as [Role, Where]
  if (may !== 'members' && !may.includes(role)) return 'not-allowed'
  if (where === 'other club' && elsewhere !== 'own') return elsewhere
  if (notTheirsToChange?.includes(role)) return 'not-allowed'
  return notTheirs?.includes(role) ? 'not-found' : 'answered'
}

/** An answer counts as one unless it says who the caller is not; 5xx never does. */
async function outcome(name: string, caller: CallerName): Promise<Outcome> {
  const endpoint = endpoints[name]
  const line = accessTable[name]
  if (!endpoint || !line) throw new Error(`no such endpoint: ${name}`)
  // Public acts end or begin a sign-in: they get a browser of their own.
  const browser = line.may === 'anybody' ? harness.client() : callers.get(caller)
  if (!browser) throw new Error(`no such caller: ${caller}`)
  const { status, code, text } = await browser.glance(endpoint, line.request(own))
  if (status >= 500) throw new Error(`${caller}: ${status} ${text}`)
  if (code === 'not-allowed' || code === 'not-signed-in' || code === 'not-found') return code
  if (code === 'invalid-request') return 'invalid'
  const leaked = caller.endsWith('other club') && Object.entries(own).find(([, id]) => text.includes(id))
  return leaked ? `leaks ${leaked[0]}` : 'answered'
}

describe('authorisation', () => {
  it('has a line for every endpoint, a route for every endpoint, and no other route', () => {
    const names = Object.keys(endpoints).sort()
    expect(Object.keys(accessTable).sort()).toEqual(names)
    const nameOf = new Map(Object.entries(endpoints).map(([name, endpoint]) => [endpoint, name]))
    expect(routes.map(({ endpoint }) => nameOf.get(endpoint) ?? endpoint.path).sort()).toEqual(names)
  })

  it.each(Object.entries(accessTable))('lets exactly those call %s who may', async (name, line) => {
    const found: Partial<Record<CallerName, Outcome>> = {}
    for (const caller of callerNames) found[caller] = await outcome(name, caller)
    const wanted = Object.fromEntries(callerNames.map((caller) => [caller, expected(line, caller)]))
    expect(found).toEqual(wanted)
  })
})
