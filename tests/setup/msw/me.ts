import type { Me } from '../../../shared/contracts/account.ts'
import { getMe, signIn, signOut } from '../../../shared/contracts/account.ts'
import type { Role } from '../../../shared/contracts/roles.ts'
import { answer, Refusal } from './answer.ts'
import { idOf } from './ids.ts'

/** An invented person of an invented club. */
export function aMe(roles: Role[], change: Partial<Me> = {}): Me {
  return {
    person: { id: idOf('person', 1), name: 'Ines Calloway', email: 'ines@saltmarsh.example' },
    club: { id: idOf('club', 1), name: 'Saltmarsh Athletic Club', timeZone: 'Europe/London', demo: true },
    roles,
    athleteId: null,
    ...change,
  }
}

/** Sign-in as the server keeps it: `session.me` is null for nobody. */
export function meHandlers(me: Me | null, password = 'a long invented password') {
  const session = { me }
  const account = me ?? aMe(['coach'])
  const handlers = [
    answer(getMe, () => session.me),
    answer(signIn, ({ body }) => {
      if (body.email !== account.person.email || body.password !== password) {
        throw new Refusal('wrong-credentials', 401, 'The address and the password do not belong together.')
      }
      session.me = account
      return account
    }),
    answer(signOut, () => {
      session.me = null
      return null
    }),
  ]
  return { session, handlers }
}
