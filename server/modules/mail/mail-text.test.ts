import { describe, expect, it } from 'vitest'
import { asHtml, asPlainText } from './mail-text.ts'

const mail = {
  subject: 'News for "Tape & Chalk"',
  paragraphs: ['One <b>bold</b> club', 'Two'],
  link: { label: 'Open', url: 'https://underfoot.example.org/?a=1&b="2"' },
  closing: 'Bye',
}

describe('a mail', () => {
  it('says the same in text and in HTML, in which names cannot become markup', () => {
    expect(asPlainText(mail)).toBe(
      'One <b>bold</b> club\n\nTwo\n\nOpen:\nhttps://underfoot.example.org/?a=1&b="2"\n\nBye\n',
    )
    const html = asHtml(mail)
    expect(html).toContain('<p>One &lt;b&gt;bold&lt;/b&gt; club</p>')
    expect(html).toContain('<title>News for &quot;Tape &amp; Chalk&quot;</title>')
    expect(html).toContain('href="https://underfoot.example.org/?a=1&amp;b=&quot;2&quot;"')
  })

  it('fetches nothing from anywhere', () => {
    expect(asHtml(mail)).not.toMatch(/<(img|link|script|style)|url\(|src=/)
  })
})
