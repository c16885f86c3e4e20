const kinds = [
  'club',
  'person',
  'athlete',
  'squad',
  'invitation',
  'session',
  'trial',
  'upload',
  'analysis',
  'recompute',
] as const

/** The n-th id of a kind: a valid UUID, the same in every run. */
export function idOf(kind: (typeof kinds)[number], n: number): string {
  const kindDigits = String(kinds.indexOf(kind) + 1).padStart(4, '0')
  return `00000000-${kindDigits}-4000-8000-${String(n).padStart(12, '0')}`
}
