const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' }
export const escapeHtml = (text: string) => text.replace(/[&<>"]/g, (letter) => entities[letter] ?? letter)

/** A plain page of the local service; nothing on it comes from anywhere else. */
export const page = (title: string, content: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(title)}</title>
<meta name="viewport" content="width=device-width, initial-scale=1">
<style>
  body { font: 1rem/1.5 sans-serif; max-width: 44rem; margin: 2rem auto; padding: 0 1rem; color-scheme: light dark }
  form { margin: 1rem 0 } label { display: block; margin: .6rem 0 } input { font: inherit; padding: .2rem .4rem }
  button { font: inherit; padding: .3rem .8rem } td, th { text-align: left; padding: .2rem 1rem .2rem 0 }
  .note { border-left: 4px solid; padding-left: .8rem }
</style></head><body>
<p><small>Local payment service of this machine, for development: no card is charged, no money moves.</small></p>
<h1>${escapeHtml(title)}</h1>
${content}
</body></html>`

/** Minor units as a number with its currency; the currencies here have two decimals. */
export const money = (amount: number, currency: string) =>
  `${(amount / 100).toFixed(2)} ${currency.toUpperCase()}`

export const note = (text: string | undefined) =>
  text ? `<p class="note" role="alert">${escapeHtml(text)}</p>` : ''

export const day = (seconds: number) => new Date(seconds * 1000).toISOString().slice(0, 16).replace('T', ' ')
