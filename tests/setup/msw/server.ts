import { setupServer } from 'msw/node'

/** No handlers of its own: a test says what the server answers, and anything else is an error. */
export const server = setupServer()
