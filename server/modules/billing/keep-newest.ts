/** A copy of a state that lives elsewhere, and how it is fetched and written. */
export interface NewestCopy<Kept, State> {
  read(): Promise<Kept>
  /** The state as it is now, by whoever it belongs to. */
  fetch(kept: Kept): Promise<State>
  /** False, and nothing written, where the copy is another than `kept` by now. */
  write(kept: Kept, state: State): Promise<boolean>
}

/** Each retry means that somebody else has just written; more than a few in a row cannot be. */
const mostTries = 20

/**
 * Brings a copy up to date while others do the same. What was fetched before another one was written may be older
 * than that, so it is thrown away and fetched again: of states fetched one after the other, the last one stays.
 */
export async function keepNewest<Kept, State>({
  read,
  fetch,
  write,
}: NewestCopy<Kept, State>): Promise<void> {
  for (let tries = 0; tries < mostTries; tries++) {
    const kept = await read()
    if (await write(kept, await fetch(kept))) return
  }
  throw new Error(`a copy was written by others ${mostTries} times in a row`)
}
