import { misplacedWords } from '../../../shared/contracts/event-words.ts'
import type { Misplaced } from '../../../shared/mechanics/events/event-order.ts'
import { namedError, notAllowed } from '../../http/errors.ts'

export const athleteNotInSession = () =>
  namedError(
    'athlete-not-in-session',
    409,
    'This athlete is not on the session’s sheet. Choose one who is, or leave the recording in the Tray.',
  )

export const athleteUnseated = () =>
  namedError(
    'athlete-unseated',
    409,
    'This athlete has no seat. The recording is kept in the Tray until a club admin gives them one under Seats.',
  )

export const mayNotMoveEvents = () =>
  notAllowed('A coach may move the events of any trial, a physio those of sessions of their own.')

export const engineOutdated = () =>
  namedError(
    'engine-outdated',
    409,
    'The engine was renewed since this page was opened, so what it showed may not be what would be saved.',
  )

export const eventMisplaced = (misplaced: Misplaced) =>
  namedError('event-misplaced', 400, misplacedWords(misplaced), { ...misplaced })
