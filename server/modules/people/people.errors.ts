import { namedError } from '../../http/errors.ts'

export const lastAdmin = () =>
  namedError('last-admin', 409, 'This is the last admin of the club. Make somebody else an admin first.')

export const alreadyInvited = () =>
  namedError(
    'already-invited',
    409,
    'This address has an open invitation. Send it again, or withdraw it first.',
  )

export const alreadyMember = () =>
  namedError(
    'already-invited',
    409,
    'Somebody with this address is in the club already. Change their roles instead.',
  )

export const athleteAlreadyLinked = () =>
  namedError('athlete-already-linked', 409, 'Somebody signs in as this athlete already.')
