import temml from 'temml'

/** What the typesetter adds for old browsers; the content policy allows no inline styles, and none is needed. */
const displayStyle = ' style="display:block math;"'

/** TeX → MathML without inline styles. Throws on TeX that cannot be set. */
export function mathOf(tex: string): string {
  return temml.renderToString(tex, { displayMode: true, throwOnError: true }).replace(displayStyle, '')
}
