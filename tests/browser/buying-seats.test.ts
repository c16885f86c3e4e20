import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { loadConfig } from '../../server/config/config.ts'
import { createDatabase } from '../../server/db/database.ts'
import { accessibilityProblems, openBrowser, sizes, visit } from '../setup/browser.ts'
import { startProduct, type Product } from '../setup/product.ts'
import { signIn } from './sign-in.ts'

const email = 'admin@saltmarsh.example'
let product: Product
let browser: Browser

beforeAll(async () => {
  product = await startProduct({ payments: true })
  const db = createDatabase(loadConfig('web', { ...product.env }), () => undefined)
  const clubId = await buildClub(db, { name: 'Saltmarsh Athletic Club', seats: 0 })
  await buildMember(db, clubId, ['admin'], { email })
  for (const name of ['Mara Ostrow', 'Tomi Lind']) await buildAthlete(db, clubId, { name })
  await db.close()
  browser = await openBrowser()
})
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

describe('a club admin', () => {
  test('buys 20 seats with a card that asks for a second step, adds five, and sees the renewal', async () => {
    const { page, complaints, close } = await visit(browser, product.url)
    await signIn(page, email)
    await page.getByRole('link', { name: 'Billing' }).click()
    await page.getByRole('textbox', { name: 'Seats' }).fill('20')
    expect(await accessibilityProblems(page)).toEqual([])
    await page.getByRole('button', { name: 'Go on to payment' }).click()
    await page.getByLabel('Card number').fill('4000 0000 0000 0002')
    await page.getByRole('button', { name: 'Pay and subscribe' }).click()
    await page.getByText('The card was declined').waitFor()
    await page.getByLabel('Card number').fill('4000 0025 0000 3155')
    await page.getByRole('button', { name: 'Pay and subscribe' }).click()
    await page.getByRole('button', { name: 'Complete' }).click()

    await page.getByRole('button', { name: 'Change the seats' }).click()
    await page.getByRole('textbox', { name: 'Seats' }).fill('25')
    await page.getByRole('button', { name: /^Pay €.* and add 5 seats$/ }).click()
    await page.getByText('The club has 25 seats.').waitFor()
    expect(await accessibilityProblems(page)).toEqual([])

    const form = { days: '31' }
    await page.request.post(`${product.paymentsUrl}/control/advance`, { form, maxRedirects: 0 })
    await expect.poll(() => openedInvoices(), { timeout: 20_000 }).toBe(3)
    await page.setViewportSize(sizes.phone)
    const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
    expect(over).toBeLessThanOrEqual(0)
    await page.getByRole('link', { name: 'Seats' }).click()
    await page.getByText('of 25 seats used').waitFor()
    expect(await accessibilityProblems(page)).toEqual([])
    expect(complaints.filter((complaint) => !/status of 401/.test(complaint))).toEqual([])
    await close()

    /** Invoices on the page, read anew. */
    async function openedInvoices(): Promise<number> {
      await page.goto('/club/billing')
      await page.getByRole('table', { name: /^Invoices/ }).waitFor()
      return page.getByText('paid', { exact: true }).count()
    }
  })
})
