/** The values that differ from how they were opened: all that a save may touch. */
export function changedValues<T extends object>(opened: T, values: T): Partial<T> {
  const keys = Object.keys(values) as (keyof T)[]
  return Object.fromEntries(
    keys.filter((key) => !same(opened[key], values[key])).map((key) => [key, values[key]]),
  ) as Partial<T>
}

/** Lists are sets here (squads, members, roles): their order says nothing. */
function same(a: unknown, b: unknown): boolean {
  if (Array.isArray(a) && Array.isArray(b)) {
    return a.length === b.length && a.every((item) => b.includes(item))
  }
  return a === b
}
