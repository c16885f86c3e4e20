import { createServer, type Server } from 'node:http'
import type { CaughtMail } from './caught-mail.ts'

/** A page that lists the caught mails, newest first, with their links; `/mails.json` for programs. */
export function createInbox(mails: readonly CaughtMail[]): Server {
  return createServer((req, res) => {
    const newestFirst = [...mails].reverse()
    if (req.url === '/mails.json') {
      res.setHeader('Content-Type', 'application/json; charset=utf-8')
      return res.end(JSON.stringify(newestFirst))
    }
    res.setHeader('Content-Type', 'text/html; charset=utf-8')
    res.setHeader('Content-Security-Policy', "default-src 'none'; style-src 'unsafe-inline'")
    res.end(page(newestFirst))
  })
}

const page = (mails: readonly CaughtMail[]) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>Caught mail</title>
<meta name="viewport" content="width=device-width, initial-scale=1">
<style>
  body { font: 1rem/1.5 sans-serif; max-width: 46rem; margin: 2rem auto; padding: 0 1rem; color-scheme: light dark }
  article { border-top: 3px solid; margin: 2rem 0; padding-top: .5rem } pre { white-space: pre-wrap; font: inherit }
</style></head><body>
<h1>Caught mail</h1>
<p>Mail of this machine's Underfoot. None of it was delivered. Reload to see newer mail.</p>
${mails.length === 0 ? '<p>No mail yet.</p>' : mails.map(article).join('\n')}
</body></html>`

const article = ({ to, from, subject, text, receivedAt }: CaughtMail) => `<article>
<h2>${escapeHtml(subject)}</h2>
<p>To ${escapeHtml(to)}, from ${escapeHtml(from)}, <time>${receivedAt.toISOString()}</time></p>
<pre>${withLinks(escapeHtml(text))}</pre>
</article>`

const withLinks = (html: string) =>
  html.replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`)

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' }
const escapeHtml = (text: string) => text.replace(/[&<>"]/g, (letter) => entities[letter] ?? letter)
