import type { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Invitation, Person } from '../../../shared/contracts/people.ts'
import type { ResultPoint } from '../../../shared/contracts/results.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { idOf } from './ids.ts'

/** One valid row each, of invented people; a test overrides what it is about. */

export function anAthlete(n: number, change: Partial<Athlete> = {}): Athlete {
  return {
    id: idOf('athlete', n),
    name: `Athlete ${n}`,
    bornOn: null,
    recordedMassKg: null,
    squadIds: [],
    linked: false,
    archived: false,
    version: 1,
    ...change,
  }
}

export function aSquad(n: number, change: Partial<Squad> = {}): Squad {
  return { id: idOf('squad', n), name: `Squad ${n}`, athleteIds: [], archived: false, version: 1, ...change }
}

export function aPerson(n: number, change: Partial<Person> = {}): Person {
  return {
    id: idOf('person', n),
    name: `Person ${n}`,
    email: `person-${n}@saltmarsh.example`,
    roles: ['coach'],
    active: true,
    version: 1,
    athleteId: null,
    ...change,
  }
}

export function anInvitation(n: number, change: Partial<Invitation> = {}): Invitation {
  return {
    id: idOf('invitation', n),
    name: `Invited ${n}`,
    email: `invited-${n}@saltmarsh.example`,
    roles: ['coach'],
    athleteId: null,
    expiresAt: '2026-12-15T09:00:00.000Z',
    expired: false,
    version: 1,
    ...change,
  }
}

export function aResult(n: number, change: Partial<ResultPoint> = {}): ResultPoint {
  return {
    sessionId: idOf('session', n),
    date: `2026-${String(n).padStart(2, '0')}-12`,
    sessionTitle: `Monthly test ${n}`,
    test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
    trialIds: [idOf('trial', 2 * n - 1), idOf('trial', 2 * n)],
    means: {
      jumpHeightImpulse: { value: 0.33 + 0.004 * n, U: 0.004, trials: 2 },
      takeoffVelocity: { value: 2.5 + 0.02 * n, U: 0.015, trials: 2 },
      landingPeakForcePerBodyWeight: { value: 3.1 + 0.05 * n, U: 0.03, trials: 2 },
    },
    ...change,
  }
}
