import { afterAll, beforeAll, expect, it } from 'vitest'
import { getTrial } from '../../shared/contracts/trials.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { engineOptions, inputsOf } from '../../server/modules/analyses/inputs.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { dropFile, settledSheet, startTestingDay, type TestingDay } from './harness/testing-day.ts'
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

it('a recording of three jumps makes three trials, each from samples of its own, with the figures of the whole', async () => {
  const performance = perform({ massKg: 75 }, [
    { protocol: 'cmj', takeoffVelocity: 2.3 },
    { protocol: 'cmj', takeoffVelocity: 2.5, leavesForS: 3 },
    { protocol: 'cmj', takeoffVelocity: 2.7 },
  ])
  const noise = { whiteNoiseN: 1 }
  const sampling = { durationS: performance.endS }
  const bytes = writeDelimited(recordJump(performance, sampling, { left: noise, right: noise }))
  await dropFile(day.coach, day.session.id, 'mara_ostrow.csv', bytes)
  const sheet = await settledSheet(day.coach, day.session.id)

  const read = readRecording(bytes, 'mara_ostrow.csv')
  if (!read.ok) throw new Error('The file is a recording.')
  expect(sheet.uploads[0]?.trials ?? sheet.trials.length).toBe(3)
  expect(sheet.trials).toHaveLength(3)
  expect(new Set(sheet.trials.map(({ athleteId }) => athleteId))).toEqual(
    new Set([day.athletes['Mara Ostrow']]),
  )
  expect(new Set(sheet.trials.map(({ preview }) => preview.join())).size).toBe(3)

  const [{ test }] = sheet.trials
  const channels = ['left', 'right']
  const whole = analyse(read.recording, engineOptions(inputsOf({ test, recordedMassKg: 75, channels })))
  expect(whole.trials).toHaveLength(3)
  for (const [i, { id }] of sheet.trials.entries()) {
    const trial = await day.coach.call(getTrial, { params: { trialId: id } })
    const { startS, endS, metrics, events } = whole.trials[i]
    expect(trial.recording.sampleCount).toBe(Math.round((endS - startS) * 1000) + 1)
    expect(trial.analysis?.metrics).toEqual(metrics)
    expect(trial.analysis?.events.takeoff?.sample).toBe(
      (events.takeoff?.sample ?? NaN) - Math.round(startS * 1000),
    )
  }
})
