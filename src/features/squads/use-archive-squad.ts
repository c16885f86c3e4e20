import type { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeSquad } from '../../api/squads/change-squad.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { wordingOf } from '../../lib/error-wording.ts'

/** Archives a squad or brings one back, at once and with a way to undo it. */
export function useArchiveSquad(): (squad: Squad) => void {
  const change = useChangeSquad()
  const announce = useAnnounce()

  const setArchived = async (squad: Squad, archived: boolean) => {
    try {
      const saved = await change.mutateAsync({
        params: { squadId: squad.id },
        body: { version: squad.version, archived },
      })
      announce({
        text: archived
          ? `${saved.name} is archived: no new sessions for it; its past sessions stay.`
          : `${saved.name} is back.`,
        undo: () => void setArchived(saved, !archived),
      })
    } catch (error) {
      const { title, advice } = wordingOf(error)
      announce({ text: `${squad.name} is unchanged. ${title}. ${advice}` })
    }
  }
  return (squad) => void setArchived(squad, !squad.archived)
}
