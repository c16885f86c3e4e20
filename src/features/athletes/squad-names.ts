import type { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'

/** The names of an athlete's squads, in the order of the list; archived squads are left out. */
export function squadNamesOf(athlete: Pick<Athlete, 'squadIds'>, squads: readonly Squad[]): string[] {
  return squads
    .filter((squad) => !squad.archived && athlete.squadIds.includes(squad.id))
    .map(({ name }) => name)
}
