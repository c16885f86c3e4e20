/**
 * A text of the same length in which every line ends with a line feed: a carriage return that stood before one stays
 * and counts as a blank, one that stood alone becomes one, so mixed line ends are no matter.
 */
export function withLineFeeds(text: string): string {
  return text.includes('\r') ? text.replace(/\r(?!\n)/gu, '\n') : text
}

/** A text whose cells stand between runs of blanks and tabs, with one blank between them and none at the ends of lines. */
export function splitAtBlanks(text: string): string {
  return text.replace(/[ \t]+/gu, ' ').replace(/^ | (?=\r?$)/gmu, '')
}
