import { useSearchParams } from 'react-router-dom'

/**
 * A list's search, sort, filter and page, held in the address so that a link, a reload and the back button show the
 * same list. What stands at its default is left out of the address.
 */
export function useListState<K extends string>(
  defaults: Record<K, string>,
): [Record<K, string>, (change: Partial<Record<K, string>>) => void] {
  const [params, setParams] = useSearchParams()
  const keys = Object.keys(defaults) as K[]
  const state = Object.fromEntries(keys.map((key) => [key, params.get(key) ?? defaults[key]])) as Record<
    K,
    string
  >

  const change = (next: Partial<Record<K, string>>) => {
    setParams(
      (current) => {
        for (const key of keys) {
          const value = next[key]
          if (value === undefined) continue
          if (value === defaults[key]) current.delete(key)
          else current.set(key, value)
        }
        return current
      },
      { replace: true, preventScrollReset: true },
    )
  }
  return [state, change]
}
