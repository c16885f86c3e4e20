import { namedError } from '../../http/errors.ts'

export const wrongCredentials = () =>
  namedError('wrong-credentials', 401, 'This address and password do not go together.')

export const wrongPassword = () => namedError('wrong-credentials', 401, 'The present password is not right.')

export const noActiveMembership = () =>
  namedError('not-allowed', 403, 'Your place in the club was closed. An admin of the club can open it again.')

export const tokenInvalid = () =>
  namedError('token-invalid', 410, 'This link was used, was withdrawn or has expired. Ask for a new one.')

export const emailTaken = () =>
  namedError('email-taken', 409, 'An account with this address was made a moment ago. Open the link again.')
