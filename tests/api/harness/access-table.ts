import { randomUUID } from 'node:crypto'
import type { Role } from '../../../shared/contracts/roles.ts'
import { usualTest } from '../../../shared/contracts/session-test.ts'
import type { CallOptions } from './api-client.ts'
import type { OneOfEach } from './one-of-each.ts'

export interface AccessLine {
  may: 'anybody' | 'members' | readonly Role[]
  /** A well-formed request that names rows of the given club. */
  request: (rows: OneOfEach) => CallOptions
  /**
   * What those who may call get of another club's rows: 'not-found' where the request names one of them; 'own'
   * where it names none, and the answer holds only what is their own club's. 'invalid' where a field of a form
   * names it, and the form says so.
   */
  elsewhere: 'not-found' | 'invalid' | 'own'
  /** Roles that may call, and are told of these rows that they are not there: nothing of them is published. */
  notTheirs?: readonly Role[]
  /** Roles that may call, and are told of these rows that somebody else alone may change them. */
  notTheirsToChange?: readonly Role[]
}

const nothing = () => ({})
const form = (body: unknown) => () => ({ body })
const token = { token: 'no-such-token-of-any-mail' }
const password = 'a password of some length'
const test = ['coach', 'physio'] as const

/** Who may call what, written down a second time and apart from the contracts: a new endpoint needs a line. */
export const accessTable: Record<string, AccessLine> = {
  signIn: { may: 'anybody', request: form({ email: 'nobody@example.org', password }), elsewhere: 'own' },
  signOut: { may: 'anybody', request: nothing, elsewhere: 'own' },
  requestReset: {
    may: 'anybody',
    request: () => ({ body: { email: `${randomUUID()}@example.org` } }),
    elsewhere: 'own',
  },
  checkReset: { may: 'anybody', request: () => ({ params: token }), elsewhere: 'own' },
  finishReset: { may: 'anybody', request: () => ({ params: token, body: { password } }), elsewhere: 'own' },
  getInvitation: { may: 'anybody', request: () => ({ params: token }), elsewhere: 'own' },
  acceptInvitation: {
    may: 'anybody',
    request: () => ({ params: token, body: { name: 'Guest', password } }),
    elsewhere: 'own',
  },
  getMe: { may: 'anybody', request: nothing, elsewhere: 'own' },
  changePassword: {
    may: 'members',
    request: form({ current: 'not the password', next: password }),
    elsewhere: 'own',
  },
  getEvents: { may: 'members', request: nothing, elsewhere: 'own' },

  listPeople: { may: ['admin'], request: nothing, elsewhere: 'own' },
  invitePerson: {
    may: ['admin'],
    request: ({ athleteId }) => ({
      body: { name: 'Guest', email: `${randomUUID()}@example.org`, roles: ['athlete'], athleteId },
    }),
    elsewhere: 'not-found',
  },
  resendInvitation: {
    may: ['admin'],
    request: ({ invitationId }) => ({ params: { invitationId }, body: { version: 1 } }),
    elsewhere: 'not-found',
  },
  withdrawInvitation: {
    may: ['admin'],
    request: ({ invitationId }) => ({ params: { invitationId }, body: { version: 9 } }),
    elsewhere: 'not-found',
  },
  changePerson: {
    may: ['admin'],
    request: ({ personId }) => ({ params: { personId }, body: { version: 1 } }),
    elsewhere: 'not-found',
  },

  listSquads: { may: ['coach', 'physio', 'admin'], request: nothing, elsewhere: 'own' },
  createSquad: {
    may: ['coach', 'admin'],
    request: ({ athleteId }) => ({ body: { name: `Squad ${randomUUID()}`, athleteIds: [athleteId] } }),
    elsewhere: 'not-found',
  },
  changeSquad: {
    may: ['coach', 'admin'],
    request: ({ squadId }) => ({ params: { squadId }, body: { version: 1 } }),
    elsewhere: 'not-found',
  },
  listAthletes: { may: ['coach', 'physio', 'admin'], request: nothing, elsewhere: 'own' },
  createAthlete: {
    may: ['coach', 'admin'],
    request: ({ squadId }) => ({
      body: { name: 'New Athlete', bornOn: null, recordedMassKg: null, squadIds: [squadId] },
    }),
    elsewhere: 'not-found',
  },
  changeAthlete: {
    may: ['coach', 'admin'],
    request: ({ athleteId }) => ({ params: { athleteId }, body: { version: 1 } }),
    elsewhere: 'not-found',
  },
  getAthlete: { may: test, request: ({ athleteId }) => ({ params: { athleteId } }), elsewhere: 'not-found' },

  getMyResults: { may: ['athlete'], request: nothing, elsewhere: 'own' },
  listSessions: { may: test, request: nothing, elsewhere: 'own' },
  createSession: {
    may: test,
    request: ({ squadId }) => ({
      body: {
        date: '2027-02-08',
        title: 'Next',
        place: null,
        note: null,
        test: usualTest('cmj'),
        squadIds: [squadId],
      },
    }),
    elsewhere: 'invalid',
  },
  getSession: { may: test, request: ({ sessionId }) => ({ params: { sessionId } }), elsewhere: 'not-found' },
  changeSession: {
    may: test,
    request: ({ sessionId }) => ({ params: { sessionId }, body: { version: 1 } }),
    elsewhere: 'not-found',
  },
  publishSession: {
    may: test,
    request: ({ sessionId }) => ({ params: { sessionId }, body: { version: 9 } }),
    elsewhere: 'not-found',
  },

  startUpload: {
    may: test,
    request: ({ sessionId }) => ({ params: { sessionId }, body: { fileName: 'a.csv', sizeBytes: 10 } }),
    elsewhere: 'not-found',
  },
  sendChunk: {
    may: test,
    request: ({ uploadId }) => ({ params: { uploadId, n: 0 }, part: Buffer.from('bytes') }),
    elsewhere: 'not-found',
  },
  finishUpload: { may: test, request: ({ uploadId }) => ({ params: { uploadId } }), elsewhere: 'not-found' },
  changeUpload: {
    may: test,
    request: ({ uploadId }) => ({ params: { uploadId }, body: { version: 9, dismissed: true } }),
    elsewhere: 'not-found',
  },
  getOriginal: { may: test, request: ({ uploadId }) => ({ params: { uploadId } }), elsewhere: 'not-found' },

  getTrial: {
    may: ['coach', 'physio', 'athlete'],
    request: ({ trialId }) => ({ params: { trialId } }),
    elsewhere: 'not-found',
    notTheirs: ['athlete'],
  },
  getSamples: {
    may: ['coach', 'physio', 'athlete'],
    request: ({ trialId }) => ({ params: { trialId } }),
    elsewhere: 'not-found',
    notTheirs: ['athlete'],
  },
  changeTrial: {
    may: test,
    request: ({ trialId }) => ({ params: { trialId }, body: { version: 9 } }),
    elsewhere: 'not-found',
  },
  moveEvents: {
    may: test,
    request: ({ trialId }) => ({
      params: { trialId },
      body: { version: 9, engineVersion: '0', events: {}, reason: null },
    }),
    elsewhere: 'not-found',
    notTheirsToChange: ['physio'],
  },
  listAnalyses: { may: test, request: ({ trialId }) => ({ params: { trialId } }), elsewhere: 'not-found' },
  getStanding: {
    may: ['coach', 'physio', 'admin'],
    request: ({ athleteId }) => ({ query: { athleteId } }),
    elsewhere: 'not-found',
  },
  listRecomputes: {
    may: ['coach', 'physio', 'admin'],
    request: ({ sessionId }) => ({ query: { sessionId } }),
    elsewhere: 'not-found',
  },
  getRecompute: {
    may: ['coach', 'physio', 'admin'],
    request: ({ recomputeId }) => ({ params: { recomputeId } }),
    elsewhere: 'not-found',
  },
  startRecompute: {
    may: ['coach', 'admin'],
    request: ({ sessionId }) => ({ body: { scope: { kind: 'session', sessionId }, dryRun: true } }),
    elsewhere: 'not-found',
  },
  cancelRecompute: {
    may: ['coach', 'admin'],
    request: ({ recomputeId }) => ({ params: { recomputeId } }),
    elsewhere: 'not-found',
  },
  getTrialCsv: { may: test, request: ({ trialId }) => ({ params: { trialId } }), elsewhere: 'not-found' },
  getSessionArchive: {
    may: test,
    request: ({ sessionId }) => ({ params: { sessionId } }),
    elsewhere: 'not-found',
  },
  listHighLandings: { may: ['physio'], request: nothing, elsewhere: 'own' },

  getClubSettings: { may: ['admin', 'physio'], request: nothing, elsewhere: 'own' },
  changeClubSettings: {
    may: ['admin', 'physio'],
    request: form({ landingPeakLimits: {}, version: 9 }),
    elsewhere: 'own',
  },
  getMeasuringSettings: { may: ['coach', 'physio', 'admin'], request: nothing, elsewhere: 'own' },
  changeMeasuringSettings: {
    may: ['coach', 'admin'],
    request: form({ changed: {}, version: 9 }),
    elsewhere: 'own',
  },
  getPlateCalibration: { may: ['coach', 'physio', 'admin'], request: nothing, elsewhere: 'own' },
  changePlateCalibration: {
    may: ['coach', 'admin'],
    request: form({
      calibrationU: { left: 0.005, right: 0.005, single: 0.005, total: 0.005 },
      place: null,
      version: 9,
    }),
    elsewhere: 'own',
  },
  getSeats: { may: ['admin'], request: nothing, elsewhere: 'own' },

  getBilling: { may: ['admin'], request: nothing, elsewhere: 'own' },
  listPlans: { may: ['admin'], request: nothing, elsewhere: 'own' },
  startCheckout: { may: ['admin'], request: form({ interval: 'month', seats: 5 }), elsewhere: 'own' },
  previewSeats: { may: ['admin'], request: () => ({ query: { seats: 5 } }), elsewhere: 'own' },
  changeSeats: { may: ['admin'], request: form({ version: 9, seats: 5, at: null }), elsewhere: 'own' },
  endSubscription: { may: ['admin'], request: form({ version: 9, ends: true }), elsewhere: 'own' },
  openPortal: { may: ['admin'], request: nothing, elsewhere: 'own' },
  refreshBilling: { may: ['admin'], request: nothing, elsewhere: 'own' },
  getSeatPlan: { may: ['admin'], request: nothing, elsewhere: 'own' },
  giveSeat: { may: ['admin'], request: ({ athleteId }) => ({ body: { athleteId } }), elsewhere: 'not-found' },
  releaseSeat: {
    may: ['admin'],
    request: ({ athleteId }) => ({ body: { athleteId } }),
    elsewhere: 'not-found',
  },
  changeSeatRule: { may: ['admin'], request: form({ byItself: true, version: 99 }), elsewhere: 'own' },
  takePaymentEvent: { may: 'anybody', request: form({ id: 'evt_of_nobody' }), elsewhere: 'own' },
}
