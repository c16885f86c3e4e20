/** Where sessions are kept in the query cache; everything of sessions begins with `all`. */
export const sessionKeys = {
  all: ['sessions'],
  lists: ['sessions', 'list'],
  one: (sessionId: string) => ['sessions', 'one', sessionId],
} as const
