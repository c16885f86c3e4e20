import { invalidRequest, namedError } from '../../http/errors.ts'

export const squadMissing = () =>
  invalidRequest('Some of what was sent could not be used.', {
    squadIds: 'One of these squads is not in the club, or is archived',
  })

export const nothingToPublish = () =>
  namedError(
    'nothing-to-publish',
    409,
    'There is nothing to publish yet: no trial is on an athlete, analysed and kept in.',
  )
