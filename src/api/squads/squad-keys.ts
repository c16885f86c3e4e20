export const squadKeys = {
  all: ['squads'] as const,
  list: () => [...squadKeys.all, 'list'] as const,
}
