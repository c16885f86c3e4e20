/** Where trials are kept in the query cache. Samples never change, so that they stand apart. */
export const trialKeys = {
  all: ['trials'],
  one: (trialId: string) => ['trials', trialId],
  overlaid: (trialId: string) => ['trials', trialId, 'overlaid'],
  samples: (trialId: string) => ['samples', trialId],
} as const
