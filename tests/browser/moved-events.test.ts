import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { accessibilityProblems, openBrowser, sizes, visit, type Visit } from '../setup/browser.ts'
import { startProduct, type Product } from '../setup/product.ts'
import { answerTimes, timeWorkers } from './answer-times.ts'
import { buildClubDay, jumpFile, people, squadName } from './club-day.ts'
import { signIn } from './sign-in.ts'

/** A coach moves the takeoff of a jump on the running product, and puts it back. */
let product: Product
let browser: Browser
let coach: Visit

beforeAll(async () => {
  product = await startProduct()
  await buildClubDay(product)
  browser = await openBrowser()
  coach = await visit(browser, product.url)
  await openTrial()
})
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

/** Makes a session with one jump and opens its trial. */
async function openTrial(): Promise<void> {
  const { page } = coach
  await signIn(page, people.coach.email)
  await page.getByRole('link', { name: 'New session' }).first().click()
  await page.getByRole('heading', { level: 1, name: 'New session' }).waitFor()
  await page.getByLabel('Title').fill('December jumps')
  await page.getByLabel(squadName).check()
  await page.getByRole('button', { name: 'Make the session' }).click()
  await page
    .getByLabel('Recordings to add')
    .setInputFiles([jumpFile('Mara Ostrow 1.csv', 1), jumpFile('Mara Ostrow 2.csv', 2)])
  await page.getByRole('link', { name: /^Mara Ostrow, trial 1, \d\d\.\d/ }).click({ timeout: 45_000 })
  await page.getByRole('heading', { name: 'Impulse ledger' }).waitFor()
}

const handle = (name: string) => coach.page.getByRole('slider', { name, exact: true })
const valueOf = async (name: string) => (await handle(name).getAttribute('aria-valuetext')) ?? ''
const provisional = (key: string) => coach.page.locator(`dd[data-metric="${key}"]`)

test('the keyboard moves takeoff by samples and the figures follow, computed beside the page', async () => {
  const { page, complaints } = coach
  const engineTimes = await timeWorkers(page)
  await page.getByRole('button', { name: 'Move an event' }).click()
  await handle('takeoff').focus()
  const automatic = await valueOf('takeoff')
  expect(automatic).toMatch(/automatic$/)
  await page.keyboard.press('ArrowLeft')
  await provisional('timeToTakeoff').getByText(/was /).waitFor()
  const times = await answerTimes(page, 'dd[data-metric=timeToTakeoff]', 'ArrowLeft', 12)
  const engine = await engineTimes()
  process.stdout.write(
    `The engine beside the page: median ${engine.median.toFixed(0)} ms, longest ${engine.longest.toFixed(0)} ms ` +
      `of ${engine.count} answers (wanted: under 50 ms)\n`,
  )
  process.stdout.write(
    `From a key press to the figures it gives, on the page: median ${times.median.toFixed(0)} ms, ` +
      `longest ${times.longest.toFixed(0)} ms of ${times.count}\n`,
  )
  expect(times.count).toBe(12)
  await page.keyboard.press('Home')
  await page.waitForFunction(
    ([name, text]) =>
      document.querySelector(`[role=slider][aria-label=${name}]`)?.getAttribute('aria-valuetext') === text,
    ['takeoff', automatic],
  )
  // The content policy lets the worker run, or there would be a complaint.
  expect(complaints.filter((complaint) => !/status of 401/.test(complaint))).toEqual([])
})

test('the pointer drags touchdown, and both sizes and themes are accessible while events are moved', async () => {
  const { page } = coach
  const before = await valueOf('touchdown')
  const box = await handle('touchdown').boundingBox()
  if (!box) throw new Error('The handle of touchdown is not drawn.')
  await page.mouse.move(box.x + box.width / 2, box.y + box.height - 6)
  await page.mouse.down()
  await page.mouse.move(box.x + box.width / 2 - 5, box.y + box.height, { steps: 3 })
  await page.mouse.up()
  await page
    .getByRole('list', { name: 'Moved events' })
    .getByText(/^touchdown from/)
    .waitFor()
  expect(await valueOf('touchdown')).not.toBe(before)
  for (const viewport of [sizes.phone, sizes.desk]) {
    await page.setViewportSize(viewport)
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.emulateMedia({ colorScheme })
      expect(await accessibilityProblems(page), `${viewport.width} px, ${colorScheme}`).toEqual([])
    }
    const over = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    )
    expect(over, `${viewport.width} px`).toBe(0)
  }
  await page.emulateMedia({ colorScheme: 'light' })
  await page.getByRole('button', { name: 'All back to automatic' }).click()
})

test('a save needs a reason; the event is then shown as adjusted, and goes back to automatic', async () => {
  const { page, complaints } = coach
  await handle('takeoff').focus()
  await page.keyboard.press('Shift+ArrowLeft')
  await page.getByText(/^takeoff from/).waitFor()
  await provisional('timeToTakeoff').getByText(/was /).waitFor()
  const now = await provisional('takeoffVelocity').innerText()
  await page.getByRole('button', { name: 'Save', exact: true }).click()
  const dialog = page.getByRole('dialog', { name: 'Save the moved events' })
  await dialog.getByRole('button', { name: 'Save', exact: true }).click()
  await dialog.getByText('Say why').waitFor()
  await dialog.getByRole('button', { name: 'The feet left one after the other' }).click()
  await dialog.getByRole('button', { name: 'Save', exact: true }).click()
  await page.getByText('Adjusted by hand').waitFor()
  await page.getByText(/Ines Calloway, .*: takeoff from .* s to .* s\./).waitFor()
  // The server's own figure is the one that was shown while the event was moved.
  const [velocity = ''] = now.split(' ')
  await page.getByRole('heading', { level: 1, name: new RegExp(`takeoff at ${velocity} `) }).waitFor()
  await page.getByText('The figures as a table').click()
  await page.getByRole('rowheader', { name: 'takeoff, adjusted' }).waitFor()
  await page.getByRole('button', { name: 'Put all events back to automatic' }).click()
  await page.getByRole('button', { name: 'Put them back' }).click()
  await page.getByText('Back to automatic', { exact: true }).waitFor()
  await page.getByText('1 earlier move').waitFor()
  await page.getByRole('rowheader', { name: 'takeoff', exact: true }).waitFor()
  expect(complaints.filter((complaint) => !/status of 401/.test(complaint))).toEqual([])
})
