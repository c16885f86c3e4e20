import type { Scope } from '../../../shared/contracts/recomputes.ts'

/** A scope as the query of a reading. */
export function scopeQuery(scope: Scope): { sessionId?: string; athleteId?: string } {
  if (scope.kind === 'session') return { sessionId: scope.sessionId }
  return scope.kind === 'athlete' ? { athleteId: scope.athleteId } : {}
}
