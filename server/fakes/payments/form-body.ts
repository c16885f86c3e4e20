/** A parsed request: texts, lists (as objects with the keys 0, 1, …) and groups. */
export interface Form {
  [name: string]: string | Form | undefined
}

/** Reads the SDK's encoding of nested fields: `items[0][price]=p&metadata[club]=c`. */
export function parseForm(text: string): Form {
  const form: Form = Object.create(null) as Form
  for (const [name, value] of new URLSearchParams(text)) put(form, name.split(/\[|\]\[|\]/u), value)
  return form
}

function put(form: Form, [head = '', ...rest]: string[], value: string): void {
  const path = rest.filter((key) => key !== '')
  if (path.length === 0 && rest.length < 2) {
    form[head] = value
    return
  }
  const inner = (form[head] ??= Object.create(null) as Form) as Form
  // `lookup_keys[]` counts up by itself.
  if (path.length === 0) inner[Object.keys(inner).length] = value
  else put(inner, path, value)
}

export const textOf = (form: Form, name: string): string | undefined => {
  const value = form[name]
  return typeof value === 'string' ? value : undefined
}
export const groupOf = (form: Form, name: string): Form => {
  const value = form[name]
  return typeof value === 'object' ? value : {}
}
/** The members of a list. */
export const listOf = (form: Form, name: string): Form[] =>
  Object.values(groupOf(form, name)).filter((value) => typeof value === 'object')
export const textsOf = (form: Form, name: string): string[] =>
  Object.values(groupOf(form, name)).filter((value) => typeof value === 'string')
export const wholeOf = (form: Form, name: string): number | undefined => {
  const text = textOf(form, name)
  return text === undefined ? undefined : Number.parseInt(text, 10)
}
/** Text fields of a group, as metadata holds them. */
export const textsByName = (form: Form): Record<string, string> =>
  Object.fromEntries(
    Object.entries(form).filter((entry): entry is [string, string] => typeof entry[1] === 'string'),
  )
