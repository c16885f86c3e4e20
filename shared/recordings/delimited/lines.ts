/** Line feed wherever there is one: a carriage return before it counts as a blank, so mixed line ends are no matter. */
export function lineEndFor(text: string): '\n' | '\r' {
  return text.includes('\n') ? '\n' : '\r'
}

/** A text whose cells stand between runs of blanks and tabs, with one blank between them and none at the ends of lines. */
export function splitAtBlanks(text: string): string {
  return text.replace(/[ \t]+/gu, ' ').replace(/^ | (?=\r?$)/gmu, '')
}
