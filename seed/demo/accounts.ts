import type { Role } from '../../shared/contracts/roles.ts'

/** The password of every demo account. Demonstration data only: the club is invented, and so is everybody in it. */
export const demoPassword = 'chalk-tape-bounce'

export interface DemoAccount {
  name: string
  email: string
  roles: Role[]
  /** Of the club's athletes, whom the person is. */
  athlete?: string
}

const address = (name: string) =>
  `${name
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z ]/g, '')
    .replace(/ /g, '.')}@saltmarsh.example`

const account = (name: string, roles: Role[]): DemoAccount => ({ name, email: address(name), roles })
const athlete = (name: string): DemoAccount => ({ ...account(name, ['athlete']), athlete: name })

/** Who can sign in to the demo club. The first admin founds it. */
export const demoAccounts: DemoAccount[] = [
  account('Orla Quenby', ['admin']),
  account('Matteo Lindqvar', ['admin', 'coach']),
  account('Hetty Marlowe-Voss', ['coach']),
  account('Dayo Akinlade-Brook', ['coach']),
  account('Senna Tervoort', ['physio']),
  athlete('Mara Ostrow'),
  athlete('Tomi Halvarden'),
  athlete('Noor Elbadrin'),
  athlete('Jonas Wiedmarck'),
  athlete('Imke Sandvoort'),
  athlete('Kwame Ossuntu'),
]
