export const athleteKeys = {
  all: ['athletes'] as const,
  list: () => [...athleteKeys.all, 'list'] as const,
  detail: (athleteId: string) => [...athleteKeys.all, 'detail', athleteId] as const,
}
