import { namedError } from '../../http/errors.ts'

export const athleteNotInSession = () =>
  namedError(
    'athlete-not-in-session',
    409,
    'This athlete is not on the session’s sheet. Choose one who is, or leave the recording in the Tray.',
  )
