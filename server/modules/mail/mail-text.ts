/** What a mail says, before it is set as text and as HTML. */
export interface MailText {
  subject: string
  paragraphs: string[]
  link: { label: string; url: string }
  closing: string
}

/** The plain part, for every mail program. */
export function asPlainText({ paragraphs, link, closing }: MailText): string {
  return [...paragraphs, `${link.label}:\n${link.url}`, closing].join('\n\n') + '\n'
}

/** The HTML part: the same words, no pictures, nothing fetched from anywhere. */
export function asHtml({ subject, paragraphs, link, closing }: MailText): string {
  const paragraph = (text: string) => `<p>${escapeHtml(text)}</p>`
  const anchor = `<p><a href="${escapeHtml(link.url)}">${escapeHtml(link.label)}</a></p>`
  return [
    `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head>`,
    '<body style="font-family: sans-serif; line-height: 1.5; max-width: 36em">',
    ...paragraphs.map(paragraph),
    anchor,
    paragraph(closing),
    '</body></html>',
  ].join('\n')
}

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' }
const escapeHtml = (text: string) => text.replace(/[&<>"]/g, (letter) => entities[letter] ?? letter)
