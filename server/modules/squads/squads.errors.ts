import { namedError } from '../../http/errors.ts'

export const nameTaken = () =>
  namedError('name-taken', 409, 'The club has a squad of this name already. Choose another name.', {
    name: 'Taken by another squad',
  })
