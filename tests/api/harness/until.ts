import { setTimeout as pause } from 'node:timers/promises'

const lookEveryMs = 25

/** Reads again and again until it is as wanted, and gives that; fails with the last reading at the deadline. */
export async function until<T>(
  read: () => Promise<T>,
  isWanted: (value: T) => boolean,
  { what, deadlineMs = 15_000 }: { what: string; deadlineMs?: number },
): Promise<T> {
  const deadline = performance.now() + deadlineMs
  for (;;) {
    const value = await read()
    if (isWanted(value)) return value
    if (performance.now() > deadline)
      throw new Error(`Not in time: ${what}. Last seen: ${JSON.stringify(value)}`)
    await pause(lookEveryMs)
  }
}
