/** Where recomputes, and what is to be recomputed, are kept in the query cache. */
export const recomputeKeys = {
  all: ['recomputes'],
  lists: ['recomputes', 'list'],
  standings: ['recomputes', 'standing'],
  one: (recomputeId: string) => ['recomputes', 'one', recomputeId],
} as const
