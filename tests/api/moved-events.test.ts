import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { getSession, publishSession } from '../../shared/contracts/sessions.ts'
import { getTrial, moveEvents, type Trial } from '../../shared/contracts/trials.ts'
import { engineVersion } from '../../shared/mechanics/version.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { buildMember } from '../../seed/builders/person.ts'
import { refusalOf, type ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  dropFile,
  jumpFile,
  newSession,
  settledSheet,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { until } from './harness/until.ts'
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, ['Mara Ostrow'])
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

let seed = 300
/** A trial of Mara's, analysed, in a session of its own. */
async function analysedTrial(client: ApiClient = day.coach): Promise<Trial> {
  const session = await newSession(client, day.squadId)
  await dropFile(client, session.id, 'mara_ostrow.csv', jumpFile((seed += 1)))
  const { trials } = await settledSheet(client, session.id)
  return client.call(getTrial, { params: { trialId: trials[0].id } })
}
const takeoffOf = (trial: Trial) => trial.analysis?.events.takeoff?.timeS ?? NaN
const body = (trial: Trial, events: Record<string, number>, reason: string | null = 'The foot dragged') => ({
  version: trial.version,
  engineVersion,
  events,
  reason,
})
const move = (trial: Trial, events: Record<string, number>, reason?: string | null) =>
  day.coach.call(moveEvents, { params: { trialId: trial.id }, body: body(trial, events, reason) })
const refused = (trial: Trial, events: Record<string, number>, change: Record<string, unknown> = {}) =>
  day.coach.send(moveEvents, { params: { trialId: trial.id }, body: { ...body(trial, events), ...change } })
const read = (trial: Trial) => day.coach.call(getTrial, { params: { trialId: trial.id } })
/** The trial once its analysis is made with these moved events. */
const analysedWith = (trial: Trial, events: Record<string, number>) =>
  until(
    () => read(trial),
    ({ analysis }) => JSON.stringify(analysis?.movedEvents) === JSON.stringify(events),
    { what: `an analysis with ${JSON.stringify(events)}` },
  )

describe('a moved event', () => {
  it('is analysed anew, and shown as adjusted with reason, person and time', async () => {
    const trial = await analysedTrial()
    const takeoff = takeoffOf(trial) - 0.01
    const saved = await move(trial, { takeoff })
    expect(saved).toMatchObject({
      version: trial.version + 1,
      eventMoves: [
        {
          events: { takeoff },
          stood: { takeoff: takeoffOf(trial) },
          reason: 'The foot dragged',
          byName: expect.stringMatching(/Person/),
        },
      ],
    })
    const adjusted = await analysedWith(trial, { takeoff })
    expect(takeoffOf(adjusted)).toBeCloseTo(takeoff, 9)
    expect(adjusted.analysis?.id).not.toBe(trial.analysis?.id)
    const change =
      (adjusted.analysis?.metrics.timeToTakeoff.value ?? NaN) -
      (trial.analysis?.metrics.timeToTakeoff.value ?? NaN)
    expect(change).toBeCloseTo(-0.01, 6)
    const sheet = await day.coach.call(getSession, { params: { sessionId: trial.sessionId } })
    expect(sheet.athletes[0].means.takeoffVelocity.value).toBeCloseTo(
      adjusted.analysis?.metrics.takeoffVelocity.value ?? NaN,
      9,
    )
  })

  it('goes back to automatic and to its first analysis, and every earlier state is kept', async () => {
    const trial = await analysedTrial()
    const takeoff = takeoffOf(trial) - 0.004
    const once = await analysedWith(await move(trial, { takeoff }), { takeoff })
    const onset = (once.analysis?.events.onset?.timeS ?? NaN) - 0.02
    const twice = await move(once, { takeoff, onset }, 'Leaned before')
    expect(twice.eventMoves[0].stood).toEqual({ onset: once.analysis?.events.onset?.timeS })
    await analysedWith(twice, { onset, takeoff })
    const back = await move(twice, {}, null)
    expect(back.eventMoves.map(({ events, reason }) => [events, reason])).toEqual([
      [{}, null],
      [{ takeoff, onset }, 'Leaned before'],
      [{ takeoff }, 'The foot dragged'],
    ])
    expect(back.eventMoves[0].stood).toEqual({ takeoff, onset })
    const automatic = await analysedWith(trial, {})
    expect(automatic.analysis).toEqual(trial.analysis)
  })

  it('needs a reason, but putting it back needs none', async () => {
    const trial = await analysedTrial()
    const events = { takeoff: takeoffOf(trial) - 0.01 }
    for (const reason of [null, ' ', 'no'])
      expect(refusalOf(await refused(trial, events, { reason }))).toEqual([400, 'invalid-request'])
    expect((await read(trial)).eventMoves).toEqual([])
  })

  it('that stands where it stood is no move', async () => {
    const trial = await analysedTrial()
    expect(refusalOf(await refused(trial, {}))).toEqual([400, 'invalid-request'])
    const moved = await move(trial, { takeoff: takeoffOf(trial) - 0.01 })
    expect(refusalOf(await refused(moved, moved.eventMoves[0].events))).toEqual([400, 'invalid-request'])
  })
})

describe('a move that cannot be', () => {
  it('outside the recording or out of order is refused with where the event can stand', async () => {
    const trial = await analysedTrial()
    const outside = await refused(trial, { onset: -0.5 })
    expect(refusalOf(outside)).toEqual([400, 'event-misplaced'])
    expect(outside.body.error.message).toMatch(/^Onset must lie within the recording, from 0 to [\d.]+ s\.$/)
    const touchdown = trial.analysis?.events.touchdown?.timeS ?? NaN
    const late = await refused(trial, { takeoff: touchdown + 0.1 })
    expect(late.body.error).toMatchObject({
      code: 'event-misplaced',
      message: `Takeoff must come before touchdown, at ${touchdown.toFixed(3)} s.`,
    })
    expect((await read(trial)).eventMoves).toEqual([])
  })

  it('is not held against an event that goes back to automatic in the same act', async () => {
    const trial = await analysedTrial()
    const still = trial.analysis?.events.still?.timeS ?? NaN
    const late = await analysedWith(await move(trial, { still: still + 0.3 }), { still: still + 0.3 })
    const zero = late.analysis?.events.landingZeroVelocity?.timeS ?? NaN
    await move(late, { landingZeroVelocity: zero + 0.02 })
  })

  it('of another engine than the one that showed it is refused', async () => {
    const trial = await analysedTrial()
    const events = { takeoff: takeoffOf(trial) - 0.01 }
    expect(refusalOf(await refused(trial, events, { engineVersion: '0.0.1' }))).toEqual([
      409,
      'engine-outdated',
    ])
  })

  it('over somebody else’s is refused, and theirs is shown', async () => {
    const trial = await analysedTrial()
    const theirs = { takeoff: takeoffOf(trial) - 0.01 }
    await move(trial, theirs)
    const stale = await refused(trial, { takeoff: takeoffOf(trial) - 0.02 })
    expect(refusalOf(stale)).toEqual([409, 'stale-version'])
    expect(stale.body.error.details.newer.eventMoves[0].events).toEqual(theirs)
  })
})

describe('who may move events', () => {
  it('a coach may of any session, a physio of their own sessions alone', async () => {
    const physio = await harness.signedIn(await buildMember(harness.db, day.clubId, ['physio']))
    const ofCoach = await analysedTrial()
    const seen = await physio.call(getTrial, { params: { trialId: ofCoach.id } })
    expect(seen.engineInputs).toBeNull()
    const events = { takeoff: takeoffOf(ofCoach) - 0.01 }
    const refusal = await physio.refusal(moveEvents, {
      params: { trialId: ofCoach.id },
      body: body(ofCoach, events),
    })
    expect(refusal).toEqual([403, 'not-allowed'])

    const own = await analysedTrial(physio)
    expect(own.engineInputs).toMatchObject({ engineVersion, recordedMassKg: 75 })
    const byPhysio = await physio.call(moveEvents, {
      params: { trialId: own.id },
      body: body(own, { takeoff: takeoffOf(own) - 0.01 }),
    })
    const byCoach = await move(byPhysio, { takeoff: takeoffOf(own) - 0.02 })
    expect(byCoach.eventMoves).toHaveLength(2)
  })
})

describe('a move after publishing', () => {
  it('leaves what athletes read, and asks for a correction', async () => {
    const trial = await analysedTrial()
    const params = { sessionId: trial.sessionId }
    const { session } = await day.coach.call(getSession, { params })
    await day.coach.call(publishSession, { params, body: { version: session.version } })
    expect((await day.coach.call(getSession, { params })).changedSincePublished).toBe(false)
    const events = { takeoff: takeoffOf(trial) - 0.01 }
    await analysedWith(await move(trial, events), events)
    expect((await day.coach.call(getSession, { params })).changedSincePublished).toBe(true)
  })
})

describe('who moved what', () => {
  it('stands in the audit log with the times before and after', async () => {
    const trial = await analysedTrial()
    const takeoff = takeoffOf(trial) - 0.01
    await move(await move(trial, { takeoff }), {}, null)
    const rows = await onDatabase(harness.database.adminUrl, async (admin) => {
      const found = await admin.query(
        `select action, detail from club.audit_log where subject_id = $1 order by at`,
        [trial.id],
      )
      return found.rows as { action: string; detail: unknown }[]
    })
    expect(rows).toEqual([
      { action: 'trial.move-events', detail: { events: { takeoff }, stood: { takeoff: takeoffOf(trial) } } },
      { action: 'trial.events-automatic', detail: { events: {}, stood: { takeoff } } },
    ])
  })
})
