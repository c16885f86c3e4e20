import { useQueryClient, type QueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import type { ClubEvent } from '../../../shared/contracts/events.ts'
import { athleteKeys } from '../athletes/athlete-keys.ts'
import { measuringSettingsKey, plateCalibrationKey } from '../clubs/club-keys.ts'
import { landingWatchKeys } from '../landing-watch/landing-watch-keys.ts'
import { recomputeKeys } from '../recomputes/recompute-keys.ts'
import { resultKeys } from '../results/get-my-results.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { squadKeys } from '../squads/squad-keys.ts'
import { trialKeys } from '../trials/trial-keys.ts'
import { coalesce } from './coalesce.ts'
import { openStream, type StreamHandlers } from './open-stream.ts'
import { shareStream } from './share-stream.ts'
import { streamHealth } from './stream-health.ts'

/**
 * Keeps what is on the screen fresh while mounted: reads again what the club's events name, and everything they
 * could have named whenever the stream opens, for what was missed before.
 */
export function useClubEvents(): void {
  const queryClient = useQueryClient()
  useEffect(() => {
    if (typeof EventSource === 'undefined') return
    const sharing = {
      locks: navigator.locks as LockManager | undefined,
      channel: (name: string) => new BroadcastChannel(name),
      open: openStream,
    }
    const end = shareStream(sharing, clubEventHandlers(queryClient))
    return () => {
      end()
      streamHealth.set(false)
    }
  }, [queryClient])
}

/** A burst of events, as of a drop of files, reads a sheet twice a second and not ten times. */
const rest = () => new Promise<void>((resolve) => setTimeout(resolve, 500))

/** What each event makes out of date. */
export function clubEventHandlers(queryClient: QueryClient): StreamHandlers {
  const refresh = (...keys: (readonly unknown[])[]) =>
    coalesce(() => Promise.all(keys.map((queryKey) => queryClient.invalidateQueries({ queryKey }))), rest)
  const refreshes: Record<ClubEvent['kind'], () => Promise<void>> = {
    session: refresh(sessionKeys.all, trialKeys.all, landingWatchKeys.all, resultKeys.all, athleteKeys.all),
    // Names, squads and the club's limits: all that shows athletes or holds them against a limit.
    athletes: refresh(athleteKeys.all, sessionKeys.all, trialKeys.all, landingWatchKeys.all, squadKeys.all),
    recomputes: refresh(recomputeKeys.all, measuringSettingsKey, plateCalibrationKey),
  }
  return {
    onOpen: () => {
      streamHealth.set(true)
      void refreshes.session()
      void refreshes.athletes()
      void refreshes.recomputes()
    },
    onLost: () => streamHealth.set(false),
    onEvent: (event) => void refreshes[event.kind](),
  }
}
