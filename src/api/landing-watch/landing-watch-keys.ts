/** Query keys of the landing watch. */
export const landingWatchKeys = { all: ['landing-watch'] } as const
