import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import type { GivenAttempt } from '../../seed/synthetic/attempts.ts'
import { accessibilityProblems, openBrowser, sizes, visit, type Visit } from '../setup/browser.ts'
import { startProduct, type Product } from '../setup/product.ts'
import { buildClubDay, people, squadName } from './club-day.ts'
import { attemptsFile } from './other-tests-day.ts'
import { signIn } from './sign-in.ts'

/** Each test other than the countermovement jump, from the session to the athlete's page, on the running product. */
interface Walk {
  title: string
  option: string
  box?: string
  side?: string
  attempt: GivenAttempt
  /** Heads of the sheet's columns, in order. */
  columns: string[]
  heading: RegExp
  phases: string[]
  /** Of the table of contacts; none where the test has none. */
  contacts: number
  events: string[]
  own: { heading: string; figure: string }
}

const hopPhases = [
  ...['First push', 'First flight'],
  ...Array.from({ length: 10 }, (_, i) => [`Contact ${i + 1}`, `Flight ${i + 1}`]).flat(),
  'Landing to standing',
]
const walks: Walk[] = [
  {
    title: 'December drops',
    option: 'Drop jump',
    box: '0.3',
    attempt: { protocol: 'dj' },
    columns: [
      'Mean RSI, m/s',
      'Mean contact time, ms',
      'Mean jump height, cm',
      'Mean landing peak force, BW',
    ],
    heading: /^Drop jump, RSI \d\.\d\d m\/s/,
    phases: ['Arrival', 'Braking', 'Propulsion', 'Flight', 'Landing', 'Settling'],
    contacts: 1,
    events: ['arrival', 'lowest', 'takeoff', 'touchdown', 'still'],
    own: { heading: 'Your jump 1 of 3', figure: 'RSI' },
  },
  {
    title: 'December left legs',
    option: 'Single-leg countermovement jump',
    side: 'left leg',
    attempt: { protocol: 'slcmj', side: 'left' },
    columns: [
      'Mean jump height, cm',
      'Mean RSImod, m/s',
      'Mean landing peak force, BW',
      'Mean landing loading rate, 20–80 %, BW/s',
    ],
    heading: /^Single-leg countermovement jump, left leg, \d\d\.\d cm/,
    phases: ['Unweighting', 'Braking', 'Propulsion', 'Flight', 'Landing', 'Settling'],
    contacts: 0,
    events: ['onset', 'lowest', 'takeoff', 'touchdown', 'still'],
    own: { heading: 'Your jump 1 of 3', figure: 'Jump height' },
  },
  {
    title: 'December hops',
    option: 'Repeated hops',
    attempt: { protocol: 'hops' },
    columns: [
      'Mean RSI of the best five hops, m/s',
      'Mean contact time, ms',
      'Mean hops',
      'Mean landing peak force, BW',
    ],
    heading: /^Repeated hops, RSI of the best five hops \d\.\d\d m\/s/,
    phases: hopPhases,
    contacts: 10,
    events: ['takeoff', 'touchdown', 'still'],
    own: { heading: 'Your set of hops 1 of 3', figure: 'RSI of the best five hops' },
  },
  {
    title: 'December landings',
    option: 'Drop landing',
    box: '0.3',
    attempt: { protocol: 'dropLanding' },
    columns: [
      'Mean landing peak force, BW',
      'Mean landing loading rate, 20–80 %, BW/s',
      'Mean landing time, s',
      'Mean time to stabilisation, s',
    ],
    heading: /^Drop landing, landing peak force \d\.\d\d BW/,
    phases: ['Arrival', 'Landing', 'Settling'],
    contacts: 0,
    events: ['touchdown', 'landing peak', 'still'],
    own: { heading: 'Your landing 1 of 3', figure: 'Landing peak force per body weight' },
  },
  {
    title: 'December squats',
    option: 'Squat jump',
    attempt: { protocol: 'sj' },
    columns: [
      'Mean jump height, cm',
      'Mean peak propulsion force, BW',
      'Mean landing peak force, BW',
      'Mean landing loading rate, 20–80 %, BW/s',
    ],
    heading: /^Squat jump, \d\d\.\d cm/,
    phases: ['Propulsion', 'Flight', 'Landing', 'Settling'],
    contacts: 0,
    events: ['onset', 'takeoff', 'touchdown', 'still'],
    own: { heading: 'Your jump 1 of 3', figure: 'Jump height' },
  },
]

let product: Product
let browser: Browser
let coach: Visit
let athlete: Visit
/** Reading and analysing is the workers' time and not the page's. */
const workMs = 45_000

beforeAll(async () => {
  product = await startProduct()
  await buildClubDay(product)
  browser = await openBrowser()
  coach = await visit(browser, product.url)
  athlete = await visit(browser, product.url, { viewport: sizes.phone })
  await signIn(coach.page, people.coach.email)
  await signIn(athlete.page, people.athlete.email)
})
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

/** No fault of accessibility in either theme and at either size, and nothing over the page's edge. */
async function expectFit({ page }: Visit): Promise<void> {
  for (const [viewport, colorScheme] of [
    [sizes.phone, 'dark'],
    [sizes.desk, 'light'],
  ] as const) {
    await page.setViewportSize(viewport)
    await page.emulateMedia({ colorScheme })
    expect(await accessibilityProblems(page), `${page.url()}, ${viewport.width}`).toEqual([])
    const over = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    )
    expect(over, `${page.url()}, ${viewport.width}`).toBe(0)
  }
}

test.each(walks)('$title: from the session to the athlete’s page', async (walk) => {
  await makeSession(walk)
  await dropTrials(walk)
  const sheetUrl = coach.page.url()
  await expectTrial(walk)
  await coach.page.goto(sheetUrl)
  await coach.page.getByRole('button', { name: 'Publish to 1 athlete' }).click()
  const dialog = coach.page.getByRole('dialog', { name: 'Publish to 1 athlete?' })
  await dialog.getByRole('button', { name: 'Publish', exact: true }).click()
  await coach.page.getByText('Published 3 trials to 1 athlete.').waitFor()
  await expectOwn(walk)
})

/** One file of one trial and one file of two, all three read, analysed and on their athlete. */
async function dropTrials({ attempt, columns, title }: Walk): Promise<void> {
  const { page } = coach
  const first = { ...attempt, leavesForS: 3, settleS: 2 }
  const seed = 10 * walks.findIndex((walk) => walk.title === title) + 1
  await page
    .getByLabel('Recordings to add')
    .setInputFiles([
      attemptsFile('Mara Ostrow 1.csv', seed, [attempt]),
      attemptsFile('Mara Ostrow 2.csv', seed + 1, [first, attempt]),
    ])
  await page.getByText('3 trials, 0 set aside').waitFor({ timeout: workMs })
  await page.getByText('being analysed').first().waitFor({ state: 'detached', timeout: workMs })
  const heads = await page.getByRole('columnheader').allInnerTexts()
  expect(heads).toEqual(['Athlete', 'Body mass, kg', ...columns, 'Trial 1', 'Trial 2', 'Trial 3'])
  const row = await page.getByRole('row', { name: /^Mara Ostrow/ }).innerText()
  expect(row).not.toMatch(/look|failed|no /)
}

/** The trial's page: result, trace with its events, ledger, contacts, checks that all pass. */
async function expectTrial({ heading, phases, events, contacts }: Walk): Promise<void> {
  const { page } = coach
  await page.getByRole('link', { name: /^Mara Ostrow, trial 2, \d/ }).click()
  await page.getByRole('heading', { level: 1, name: heading }).waitFor()
  const ledger = page.getByRole('region', { name: 'Impulse ledger' })
  const entries = await ledger.getByRole('rowheader').allInnerTexts()
  expect(entries.slice(1, -1)).toEqual(phases)
  expect(entries.at(-1)).toBe('Closing, standing still')
  await page.getByText(/^All \d+ pass$/).waitFor()
  await page.getByText('The figures as a table').click()
  const trace = page.getByRole('table', { name: 'Force and momentum at each event' })
  const named = await trace.getByRole('rowheader').allInnerTexts()
  expect(named.filter((name) => events.includes(name))).toEqual(events)
  // The zero is that of the empty plates, and momentum is back at nothing where the athlete stands again.
  expect(await trace.getByRole('row', { name: /^still/ }).innerText()).toMatch(
    /6[67]\d N.*\s[+−]?[0-2]\.\d kg·m\/s/s,
  )
  const hops = page.getByRole('table', { name: 'Contacts with the ground, and the flight after each' })
  expect(await hops.getByRole('rowheader').count()).toBe(contacts)
  await page.getByText('The figures as a table').click()
  await expectFit(coach)
}

/** The athlete's own page, and the newest trial on it. */
async function expectOwn({ title, own }: Walk): Promise<void> {
  const { page } = athlete
  await page.goto('/me')
  await page.getByText(own.figure, { exact: true }).first().waitFor()
  await page
    .getByText(new RegExp(`^${title}`))
    .first()
    .waitFor()
  await expectFit(athlete)
  await page
    .getByRole('link', { name: / 1 of / })
    .first()
    .click()
  await page.getByRole('heading', { level: 1, name: own.heading }).waitFor()
  await page.getByRole('region', { name: 'What was measured' }).getByText(own.figure).waitFor()
  await expectFit(athlete)
}

async function makeSession({ title, option, box, side }: Walk): Promise<void> {
  const { page } = coach
  await page.goto('/sessions/new')
  await page.getByLabel('Title').fill(title)
  await page.getByLabel('Test', { exact: true }).selectOption(option)
  if (box) await page.getByLabel('Box, m').fill(box)
  if (side) await page.getByLabel('Side').selectOption(side)
  await page.getByLabel(squadName).check()
  await page.getByRole('button', { name: 'Make the session' }).click()
  await page.getByRole('heading', { level: 1, name: title }).waitFor()
}
