import type { Squad } from '../../../shared/contracts/squads.ts'
import { TickList } from '../../components/tick-list.tsx'
import { countOf } from '../../lib/count-of.ts'

interface Props {
  hint: string
  squads: readonly Squad[]
  chosen: string[]
  onChange: (chosen: string[]) => void
  error: string | undefined
}

/** Which squads a session tests: those in use, and an archived one that the session has already. */
export function SquadTicks({ hint, squads, chosen, onChange, error }: Props) {
  return (
    <TickList
      label="Squads"
      hint={hint}
      items={squads.map(({ id, name, athleteIds, archived }) => ({
        id,
        words: archived ? `${name} (archived)` : name,
        hint: countOf(athleteIds.length, athleteIds.length, 'athlete'),
      }))}
      none="The club has no squads yet: make one first, under Squads."
      chosen={chosen}
      onChange={onChange}
      error={error}
    />
  )
}
