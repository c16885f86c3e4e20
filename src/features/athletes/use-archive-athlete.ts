import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { useChangeAthlete } from '../../api/athletes/change-athlete.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { wordingOf } from '../../lib/error-wording.ts'

/** Archives an athlete or brings one back, at once and with a way to undo it: nothing is lost by either. */
export function useArchiveAthlete(): (athlete: Athlete) => void {
  const change = useChangeAthlete()
  const announce = useAnnounce()

  const setArchived = async (athlete: Athlete, archived: boolean) => {
    try {
      const saved = await change.mutateAsync({
        params: { athleteId: athlete.id },
        body: { version: athlete.version, archived },
      })
      announce({
        text: archived
          ? `${saved.name} is archived: off the roster and its seat free, results kept.`
          : `${saved.name} is back on the roster.`,
        undo: () => void setArchived(saved, !archived),
      })
    } catch (error) {
      const { title, advice } = wordingOf(error)
      announce({ text: `${athlete.name} is unchanged. ${title}. ${advice}` })
    }
  }
  return (athlete) => void setArchived(athlete, !athlete.archived)
}
