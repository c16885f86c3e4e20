import { generatePath } from 'react-router-dom'

/** Every page's address as a router pattern, once. */
export const paths = {
  home: '/',
  signIn: '/sign-in',
  invite: '/invite/:token',
  reset: '/reset',
  finishReset: '/reset/:token',
  account: '/account',
  sessions: '/sessions',
  newSession: '/sessions/new',
  session: '/sessions/:sessionId',
  trial: '/trials/:trialId',
  athletes: '/athletes',
  athlete: '/athletes/:athleteId',
  landingWatch: '/landing-watch',
  me: '/me',
  people: '/club/people',
  squads: '/club/squads',
  seats: '/club/seats',
  billing: '/club/billing',
  settings: '/club/settings',
  methods: '/methods',
  method: '/methods/:key',
} as const

/** Addresses of pages about one thing. */
export const pathOf = {
  session: (sessionId: string) => generatePath(paths.session, { sessionId }),
  trial: (trialId: string) => generatePath(paths.trial, { trialId }),
  athlete: (athleteId: string) => generatePath(paths.athlete, { athleteId }),
  method: (key: string) => generatePath(paths.method, { key }),
}

/**
 * Where to go after signing in: the page that asked for it, if it is one of ours. Anything that is not a path on
 * this site (`https://…`, `//…`, `/\…`) is dropped, so that a crafted link cannot lead away; and so is anything
 * with a tab or line break, which browsers leave out of an address (WHATWG URL).
 */
export function safeReturnPath(from: string | null): string {
  if (from === null || !/^\/(?![/\\])\P{Cc}*$/u.test(from) || from.startsWith(paths.signIn)) return paths.home
  return from
}

export function signInPathFrom(location: { pathname: string; search: string }): string {
  const from = location.pathname + location.search
  return from === paths.home ? paths.signIn : `${paths.signIn}?from=${encodeURIComponent(from)}`
}
