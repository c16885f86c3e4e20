/** Longest name that is kept, in characters. */
const LONGEST_NAME = 200

/** Unseen and control characters, which can make a name look like another. */
const UNSEEN = /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}]/gu

/**
 * The last part of a name that may carry a folder path of any system, without unseen characters. `pathRemoved`
 * says that there was more. An empty rest becomes "recording".
 */
export function fileNameOnly(name: string): { name: string; pathRemoved: boolean } {
  const parts = name.replace(UNSEEN, '').split(/[\\/]/u)
  const last = (parts.at(-1) ?? '').trim()
  const kept = /^\.*$/u.test(last) ? 'recording' : Array.from(last).slice(0, LONGEST_NAME).join('')
  return { name: kept, pathRemoved: parts.length > 1 }
}
