/** The saved figure beside the one that an event being moved gives; nothing where the two read the same. */
export function Was({ saved, now }: { saved: string | null | undefined; now: string | null }) {
  if (saved === undefined || saved === now) return null
  return <span className="block text-small text-ink-2 italic">was {saved ?? 'missing'}</span>
}
