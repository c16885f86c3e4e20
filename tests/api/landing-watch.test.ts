import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { changeClubSettings, getClubSettings } from '../../shared/contracts/clubs.ts'
import { listHighLandings } from '../../shared/contracts/landing-watch.ts'
import { changeTrial } from '../../shared/contracts/trials.ts'
import { buildMember } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  dropFile,
  jumpFile,
  newSession,
  settledSheet,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay
let physio: ApiClient
let peaks: Record<string, number>

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, ['Mara Ostrow', 'Tomi Lind'])
  physio = await harness.signedIn(await buildMember(harness.db, day.clubId, ['physio']))
  const drop = (name: string, seed: number, jump: Parameters<typeof jumpFile>[1]) =>
    dropFile(day.coach, day.session.id, name, jumpFile(seed, jump))
  await drop('mara_ostrow_soft.csv', 1, { landingS: 0.32 })
  await drop('mara_ostrow_hard.csv', 2, { landingS: 0.18, takeoffVelocity: 2.6 })
  // Steps off in the middle of the landing: a failed check takes its landing away.
  await drop('tomi_lind_off.csv', 3, { landingS: 0.18, stepOffAfterS: 0.1 })
  await drop('in the tray.csv', 4, { landingS: 0.18 })
  const { trials } = await settledSheet(day.coach, day.session.id)
  peaks = Object.fromEntries(
    trials.map(({ fileName, analysis }) => [
      fileName,
      analysis?.metrics.landingPeakForcePerBodyWeight?.value ?? 0,
    ]),
  )
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

const watch = (query = {}) => physio.call(listHighLandings, { query })
async function setLimit(cmj: number | null): Promise<void> {
  const { version } = await physio.call(getClubSettings)
  const landingPeakLimits = cmj === null ? {} : { cmj }
  await physio.call(changeClubSettings, { body: { version, landingPeakLimits } })
}

describe('the Landing watch', () => {
  it('lists nothing until the club sets a limit', async () => {
    expect(await watch()).toEqual({ limits: {}, landings: [] })
  })

  it('lists landings above the limit, heaviest first, and no trial of the Tray', async () => {
    await setLimit(1)
    const { limits, landings } = await watch()
    expect(limits).toEqual({ cmj: 1 })
    const listed = landings.map(({ peak }) => peak)
    expect(listed).toEqual([...listed].sort((a, b) => b - a))
    expect(landings.map(({ athlete }) => athlete.name).sort()).toEqual([
      'Mara Ostrow',
      'Mara Ostrow',
      'Tomi Lind',
    ])
  })

  it('lists only what is above it', async () => {
    const between = (peaks['mara_ostrow_soft.csv'] + peaks['mara_ostrow_hard.csv']) / 2
    await setLimit(between)
    const { landings } = await watch()
    const ofMara = landings.filter(({ athlete }) => athlete.name === 'Mara Ostrow')
    expect(ofMara).toMatchObject([{ peak: peaks['mara_ostrow_hard.csv'], limit: between, unverified: false }])
    expect(ofMara[0].U).toBeGreaterThan(0)
  })

  it('marks a landing that a failed check affects as unverified', async () => {
    await setLimit(1)
    const { landings } = await watch()
    expect(landings.map(({ athlete, unverified }) => [athlete.name, unverified])).toEqual(
      expect.arrayContaining([['Tomi Lind', true]]),
    )
  })

  it('looks back as many days as are asked for', async () => {
    await setLimit(1)
    const old = await newSession(day.coach, day.squadId, '2026-11-01')
    await dropFile(day.coach, old.id, 'mara_ostrow_old.csv', jumpFile(9, { landingS: 0.18 }))
    await settledSheet(day.coach, old.id)
    const inDays = async (days: number) =>
      (await watch({ days })).landings.filter(({ sessionId }) => sessionId === old.id)
    expect(await inDays(90)).toEqual([])
    expect(await inDays(200)).toHaveLength(1)
  })

  it('drops a landing whose trial is set aside', async () => {
    await setLimit(1)
    const before = (await watch()).landings
    const { trialId } = before[0]
    await day.coach.call(changeTrial, { params: { trialId }, body: { version: 1, setAsideReason: 'Fell' } })
    expect((await watch()).landings).toHaveLength(before.length - 1)
  })
})
