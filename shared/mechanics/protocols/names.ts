import type { Protocol } from '../types.ts'

/** The tests as people call them. */
export const protocolNames: Readonly<Record<Protocol, string>> = {
  cmj: 'Countermovement jump',
  sj: 'Squat jump',
  dj: 'Drop jump',
  slcmj: 'Single-leg countermovement jump',
  dropLanding: 'Drop landing',
  hops: 'Repeated hops',
}
