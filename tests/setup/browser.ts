import axe from 'axe-core'
import { chromium, type Browser, type BrowserContextOptions, type Page } from 'playwright-core'
import { chromiumPath } from '../../server/setup/chromium.mjs'

/** Debian's Chromium would otherwise look for updates, safe-browsing lists and field trials. */
const quiet = [
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-domain-reliability',
  '--disable-sync',
  '--no-first-run',
  '--no-default-browser-check',
]

/** The two sizes every screen has to work at, in CSS pixels. */
export const sizes = { phone: { width: 360, height: 740 }, desk: { width: 1440, height: 900 } } as const

/**
 * Starts the browser. Close it in `afterAll`. Its own sandbox works neither for root nor in most containers,
 * and the only pages it opens are the product's.
 */
export async function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: chromiumPath,
    headless: true,
    chromiumSandbox: false,
    args: quiet,
  })
}

/** A page of a visitor of its own: nobody is signed in, no cookie is shared. */
export interface Visit {
  page: Page
  /** What went wrong in the page so far: uncaught errors, console errors, blocked content. */
  complaints: string[]
  close: () => Promise<void>
}

/** Opens a fresh visit to a product. */
export async function visit(
  browser: Browser,
  baseURL: string,
  options: BrowserContextOptions = {},
): Promise<Visit> {
  const context = await browser.newContext({ baseURL, viewport: sizes.desk, locale: 'en-GB', ...options })
  context.setDefaultTimeout(15_000)
  const page = await context.newPage()
  const complaints: string[] = []
  page.on('pageerror', (error) => complaints.push(String(error)))
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(message.text())
  })
  return { page, complaints, close: () => context.close() }
}

/**
 * What axe finds against WCAG 2.2 A and AA on the page as it stands, as "rule: what it is about". The script goes
 * in by evaluation, since the product's content policy blocks script elements that are not its own.
 */
export async function accessibilityProblems(page: Page): Promise<string[]> {
  await page.evaluate(axe.source)
  return page.evaluate(async () => {
    const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']
    const { axe: inPage } = window as unknown as { axe: typeof axe }
    const { violations } = await inPage.run(document, { runOnly: { type: 'tag', values: tags } })
    return violations.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(' ')}`))
  })
}
