import { mkdtempSync, rmSync, truncateSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { accessibilityProblems, openBrowser, sizes, visit, type Visit } from '../setup/browser.ts'
import { startProduct, type Product } from '../setup/product.ts'
import { athleteNames, buildClubDay, csv, fortyFiles, jumpFile, people, squadName } from './club-day.ts'
import { signIn } from './sign-in.ts'

/**
 * The whole job on the running product, role after role on one club: each step goes on from what the one before
 * it left, as a test day does.
 */
let product: Product
let browser: Browser
let coach: Visit
/** The coach's sheet, for going back to. */
let sheetUrl = ''

/** Reading and analysing forty files is the workers' time and not the page's. */
const workMs = 45_000

/** Asked before anybody is signed in, and refused by right. */
const expected = /status of 401/

beforeAll(async () => {
  product = await startProduct()
  await buildClubDay(product)
  browser = await openBrowser()
  coach = await visit(browser, product.url)
})
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

/** No fault of accessibility in either theme. */
async function expectAccessible({ page }: Visit): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme })
    expect(await accessibilityProblems(page), `${page.url()}, ${colorScheme}`).toEqual([])
  }
  await page.emulateMedia({ colorScheme: 'light' })
}

/** Nothing runs over the page's edge. */
async function expectNoSidewaysScroll({ page }: Visit): Promise<void> {
  const over = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(over, page.url()).toBe(0)
}

const expectNoComplaints = ({ complaints }: Visit) =>
  expect(complaints.filter((complaint) => !expected.test(complaint))).toEqual([])

describe('a coach', () => {
  test('makes a session of a squad', async () => {
    const { page } = coach
    await signIn(page, people.coach.email)
    await page.getByRole('heading', { level: 1, name: 'Sessions' }).waitFor()
    await expectAccessible(coach)
    await page.getByRole('link', { name: 'New session' }).first().click()
    await page.getByRole('heading', { level: 1, name: 'New session' }).waitFor()
    await page.getByLabel('Title').fill('December jumps')
    await page.getByLabel(/^Place/).fill('North hall')
    await page.getByLabel(squadName).check()
    await expectAccessible(coach)
    await page.getByRole('button', { name: 'Make the session' }).click()
    await page.getByRole('heading', { level: 1, name: 'December jumps' }).waitFor()
    for (const name of athleteNames) await page.getByRole('row', { name: `${name} no trial yet` }).waitFor()
    sheetUrl = page.url()
  })

  test('drops 40 files at once and finds every trial analysed on its athlete, the unnamed one in the Tray', async () => {
    const { page } = coach
    await page.getByLabel('Recordings to add').setInputFiles(fortyFiles())
    await page.getByText('40 of 40 files read').waitFor({ timeout: workMs })
    for (const name of athleteNames) {
      await page
        .getByRole('link', { name: new RegExp(`^${name}, trial 3, \\d\\d\\.\\d`) })
        .waitFor({ timeout: workMs })
    }
    await page.getByRole('link', { name: /^Mara Ostrow, trial 6, \d\d\.\d/ }).waitFor()
    await page.getByText('40 trials, 0 set aside').waitFor()
    await page.getByRole('region', { name: 'Tray' }).getByRole('link', { name: 'plate_0931.csv' }).waitFor()
    await page.getByRole('list', { name: 'Files on their way' }).waitFor({ state: 'detached' })
    await expectAccessible(coach)
  })

  test('puts the trial in the Tray on an athlete by hand', async () => {
    const { page } = coach
    await page.getByLabel('Athlete of plate_0931.csv').selectOption('Selma Grøndal')
    await page.getByRole('button', { name: /^Assign plate_0931\.csv/ }).click()
    await page.getByRole('link', { name: /^Selma Grøndal, trial 4/ }).waitFor()
    await page.getByText('empty: nothing waits for you').waitFor()
  })

  test('bad files are refused or kept with what was found and what to do, and the good one beside them goes through', async () => {
    const { page } = coach
    const folder = mkdtempSync(join(tmpdir(), 'underfoot-drop-'))
    try {
      const good = jumpFile('Osei Kwarteng again.csv', 300, { massKg: 73 })
      const files = [
        csv('empty.csv', ''),
        csv('photo.csv', Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex')),
        csv('words.csv', 'nothing but words\nand some more of them\n'),
        csv('angles.csv', `Time (s);Angle (deg)\n${'0.01;12\n'.repeat(200)}`),
        good,
      ]
      const paths = files.map(({ name, buffer }) => {
        const path = join(folder, name)
        writeFileSync(path, buffer)
        return path
      })
      const big = join(folder, 'big.csv')
      writeFileSync(big, '')
      truncateSync(big, 65 * 1024 * 1024)
      await page.getByLabel('Recordings to add').setInputFiles([...paths, big])
      await page.getByText('45 of 45 files read').waitFor({ timeout: workMs })
      const tray = page.getByRole('region', { name: 'Tray' })
      const said = async (name: string) =>
        (await tray.getByRole('listitem').filter({ hasText: name }).innerText()).replace(/\s+/g, ' ')
      expect(await said('empty.csv')).toMatch(/The file is empty.*Export the recording again/)
      expect(await said('photo.csv')).toMatch(/PNG picture.*Export the recording as delimited text/)
      expect(await said('words.csv')).toMatch(/text without numbers.*Export the recording as delimited text/)
      expect(await said('angles.csv')).toMatch(/names a vertical force.*head the force column with its unit/)
      expect(await said('big.csv')).toMatch(
        /The file has 65 MiB, and 64 MiB is the most.*Split the recording/,
      )
      await page.getByRole('link', { name: /^Osei Kwarteng, trial 4, \d\d\.\d/ }).waitFor({ timeout: workMs })
      await expectAccessible(coach)
    } finally {
      rmSync(folder, { recursive: true })
    }
  })

  test('clears a file from the Tray that becomes no trial, and finds it again', async () => {
    const { page } = coach
    const tray = page.getByRole('region', { name: 'Tray' })
    await tray.getByRole('button', { name: 'Dismiss angles.csv' }).click()
    await page.getByText('Dismissed: angles.csv. The file is kept.').waitFor()
    await tray.getByText('Show 1 dismissed file').click()
    const takeBack = tray
      .getByRole('list', { name: 'Dismissed files' })
      .getByRole('button', { name: 'Take back angles.csv' })
    await takeBack.waitFor()
    await expectAccessible(coach)
    await takeBack.click()
    await tray.getByRole('button', { name: 'Dismiss angles.csv' }).waitFor()
  })

  test('a file with path parts in its name is kept under its last part, and the same bytes are not kept twice', async () => {
    const { page } = coach
    const again = fortyFiles()[0]!
    const transfer = await page.evaluateHandle((text) => {
      const data = new DataTransfer()
      data.items.add(new File([text], '../../etc/Ruth Hallam again.csv', { type: 'text/csv' }))
      return data
    }, again.buffer.toString())
    await page.getByRole('heading', { level: 1 }).dispatchEvent('drop', { dataTransfer: transfer })
    await page.getByText('46 of 46 files read').waitFor({ timeout: workMs })
    const item = page
      .getByRole('region', { name: 'Tray' })
      .getByRole('listitem')
      .filter({ hasText: 'here already' })
    expect(await item.innerText()).toMatch(
      /Ruth Hallam again\.csv[\s\S]*The same recording as Mara Ostrow jump 1\.csv/,
    )
    expect(await item.innerText()).not.toContain('etc')
  })

  test('the original of what was refused and of what was read comes back byte for byte', async () => {
    const { page } = coach
    const download = page.waitForEvent('download')
    await page.getByRole('link', { name: 'Download the original of words.csv' }).click()
    const file = await download
    expect(file.suggestedFilename()).toBe('words.csv')
    const { uploads } = await (await page.request.get(`/api${new URL(sheetUrl).pathname}`)).json()
    const [first] = fortyFiles()
    const { id } = uploads.find((upload: { fileName: string }) => upload.fileName === first!.name)
    const original = await (await page.request.get(`/api/uploads/${id}/original`)).body()
    expect(original.equals(first!.buffer)).toBe(true)
  })

  test('opens a trial by keyboard: trace, ledger, checks and figures with their uncertainty', async () => {
    const { page } = coach
    await page.getByRole('link', { name: /^Dario Lindqvist, trial 1/ }).focus()
    await page.keyboard.press('ArrowRight')
    await page.keyboard.press('Enter')
    await page.getByRole('heading', { level: 1, name: /Countermovement jump, \d\d\.\d cm/ }).waitFor()
    await page.getByText(/the books close\./).waitFor()
    await page.getByText(/All \d+ pass|more, all pass/).waitFor()
    const trace = page.getByRole('slider', { name: 'Read the trace' })
    await trace.focus()
    for (let i = 0; i < 3; i++) await page.keyboard.press('PageUp')
    await page.getByText(/momentum \+\d+\.\d kg·m\/s/).waitFor()
    await expectAccessible(coach)
    await expectNoSidewaysScroll(coach)
    await page.setViewportSize(sizes.phone)
    await expectNoSidewaysScroll(coach)
    await expectAccessible(coach)
    await page.setViewportSize(sizes.desk)
  })

  test('sets a trial aside with a reason, takes it back, sets it aside again', async () => {
    const { page } = coach
    await page.goto(sheetUrl)
    const setAside = async () => {
      await page.getByRole('link', { name: /^Mara Ostrow, trial 2/ }).focus()
      await page.keyboard.press('x')
      await page.getByRole('button', { name: 'Stepped off on landing' }).click()
      await page.getByRole('dialog').getByRole('button', { name: 'Set aside', exact: true }).click()
      await page
        .getByRole('link', { name: 'Mara Ostrow, trial 2, set aside: Stepped off on landing' })
        .waitFor()
    }
    await setAside()
    await page.getByText('41 trials, 1 set aside').waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText('41 trials, 0 set aside').waitFor()
    await setAside()
  })

  test('publishes, having read what athletes will see and what stays out', async () => {
    const { page } = coach
    await page.getByRole('button', { name: 'Publish to 12 athletes' }).click()
    const dialog = page.getByRole('dialog', { name: 'Publish to 12 athletes?' })
    await dialog.getByText('Stays out: 1 trial set aside.').waitFor()
    await expectAccessible(coach)
    await dialog.getByRole('button', { name: 'Publish', exact: true }).click()
    await page.getByText('Published 40 trials to 12 athletes.').waitFor()
    await page.getByText(/^Published .* by Ines Calloway/).waitFor()
    await page.setViewportSize(sizes.phone)
    await expectNoSidewaysScroll(coach)
    await page.setViewportSize(sizes.desk)
    expectNoComplaints(coach)
  })
})

describe('an athlete on a phone of 360 px', () => {
  test('sees the published result, the landing and every jump but the one set aside', async () => {
    const phone = await visit(browser, product.url, { viewport: sizes.phone, hasTouch: true, isMobile: true })
    const { page } = phone
    await signIn(page, people.athlete.email)
    await page.getByRole('heading', { level: 1, name: 'My results' }).waitFor()
    await page.getByText(/^cm, give or take \d+\.\d$/).waitFor()
    await page.getByText('The average of 5 jumps.', { exact: false }).waitFor()
    await page
      .getByRole('region', { name: 'How you landed' })
      .getByText(/times your body weight/)
      .waitFor()
    await expectNoSidewaysScroll(phone)
    await expectAccessible(phone)
    expect(await page.getByRole('link', { name: /^Jump \d/ }).count()).toBe(5)
    await page.getByRole('link', { name: /^Jump 2/ }).click()
    await page.getByRole('heading', { level: 1, name: 'Your jump 2 of 5' }).waitFor()
    await page.getByRole('slider', { name: 'Read the trace' }).waitFor()
    await expectNoSidewaysScroll(phone)
    await expectAccessible(phone)
    await page.goto(sheetUrl)
    await page.getByRole('heading', { name: 'Your role does not allow this' }).waitFor()
    expectNoComplaints(phone)
    await phone.close()
  })
})

describe('a physio', () => {
  test('sets the club’s limit and sees the landings above it, heaviest first, with the trial to open', async () => {
    const physio = await visit(browser, product.url)
    const { page } = physio
    await signIn(page, people.physio.email)
    await page.getByRole('link', { name: 'Landing watch' }).click()
    await page.getByText('No limit is set').waitFor()
    await expectAccessible(physio)
    const { version } = await (await page.request.get('/api/club/settings')).json()
    const answer = await page.request.patch('/api/club/settings', {
      data: { landingPeakLimits: { cmj: 3.5 }, version },
      headers: { 'Idempotency-Key': crypto.randomUUID() },
    })
    expect(answer.status()).toBe(200)
    const table = page.getByRole('table', { name: 'Above the limit, heaviest first' })
    // The list stands for a moment as it was read before the limit was: what is read is the list with its limit.
    await page.getByText('The club’s limits: Countermovement jump 3.50 BW.').waitFor()
    await table
      .getByRole('link', { name: /^Open the trial/ })
      .first()
      .waitFor()
    const peaks = await table
      .getByRole('row')
      .evaluateAll((rows) =>
        rows.slice(1).map((row) => Number.parseFloat(row.querySelectorAll('td')[0]?.textContent ?? '')),
      )
    expect(peaks.length).toBeGreaterThan(0)
    expect(peaks.every((peak) => peak >= 3.5)).toBe(true)
    expect(peaks).toEqual([...peaks].sort((a, b) => b - a))
    await page.getByText(/A measurement, not a diagnosis/).waitFor()
    await expectAccessible(physio)
    await page.setViewportSize(sizes.phone)
    await expectNoSidewaysScroll(physio)
    await page
      .getByRole('link', { name: /^Open the trial/ })
      .first()
      .click()
    await page.getByRole('heading', { name: 'Impulse ledger' }).waitFor()
    expectNoComplaints(physio)
    await physio.close()
  })
})

describe('a club admin', () => {
  test('sees people and seats in use, and no measurement', async () => {
    const admin = await visit(browser, product.url)
    const { page } = admin
    await signIn(page, people.admin.email)
    await page.goto('/club/people')
    for (const { name } of Object.values(people)) await page.getByText(name).first().waitFor()
    await expectAccessible(admin)
    await page.goto('/club/seats')
    await page
      .getByText(/12.*20|20.*12/)
      .first()
      .waitFor()
    await expectAccessible(admin)
    await page.goto(sheetUrl)
    await page.getByRole('heading', { name: 'Your role does not allow this' }).waitFor()
    expectNoComplaints(admin)
    await admin.close()
  })
})
