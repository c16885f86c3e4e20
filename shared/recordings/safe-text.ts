/** Longest excerpt of a file that an error or a note quotes. */
const LONGEST = 60

/** C0 and C1 controls, bidirectional overrides, zero-width and other unseen marks, lone surrogates. */
const UNSEEN = /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}]/gu

/** A piece of a file fit to stand in a sentence: unseen marks replaced, blanks collapsed, cut to 60 characters. */
export function shown(text: string): string {
  const cleaned = text
    .slice(0, 4 * LONGEST)
    .replace(/\s+/gu, ' ')
    .replace(UNSEEN, '\uFFFD')
    .trim()
  const characters = Array.from(cleaned)
  return characters.length <= LONGEST ? cleaned : `${characters.slice(0, LONGEST - 1).join('')}…`
}

/** `"a", "b" and "c"`, at most `limit` of them. */
export function listed(texts: readonly string[], limit = 6): string {
  const quoted = texts.slice(0, limit).map((text) => `“${shown(text)}”`)
  if (texts.length > limit) return `${quoted.join(', ')} and ${texts.length - limit} more`
  const last = quoted.pop() ?? ''
  return quoted.length > 0 ? `${quoted.join(', ')} and ${last}` : last
}
