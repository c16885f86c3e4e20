import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { sampleRecordings } from '../../api/methods/get-sample-recording.ts'
import { metricKeys } from '../../../shared/mechanics/catalogue.ts'
import { checkKeys } from '../../../shared/mechanics/checks/check-definitions.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'
import { traceDataOf } from '../trials/trace-data-of.ts'
import { metricNotes } from './notes/metric-notes.ts'
import { sampleOfCheck, sampleOfMetric } from './sample-of.ts'
import { traceOfNote } from './trace-of-note.ts'
import { weighedWindow } from './weighed-window.ts'
import { workOut } from './worked-example.ts'

const examples = Object.fromEntries(
  Object.entries(sampleRecordings).map(([protocol, { path, test: asked }]) => [
    protocol,
    workOut(readFileSync(`public${path}`), path, asked),
  ]),
) as Record<Protocol, ReturnType<typeof workOut>>
const protocols = Object.keys(examples) as Protocol[]

describe('the worked example', () => {
  test.each(metricKeys)('gives %s, and where it has no uncertainty the note says why', (key) => {
    const { analysis } = examples[sampleOfMetric(key)]
    const figure = analysis.metrics[key] ?? analysis.sides?.left[key]
    expect(figure).toBeDefined()
    if (figure!.U === null) expect(metricNotes[key].withoutU).toBeDefined()
  })

  test('runs into every check but the one that needs a recorded mass', () => {
    const missed = checkKeys.filter(
      (key) => !examples[sampleOfCheck(key)].analysis.checks.some((check) => check.key === key),
    )
    expect(missed).toEqual(['mass-agreement'])
  })

  test.each(protocols)('of %s fails no check', (protocol) => {
    const { checks } = examples[protocol].analysis
    expect(checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
  })

  test.each(metricKeys)('shows where %s is read', (key) => {
    const example = examples[sampleOfMetric(key)]
    const trace = traceDataOf(example, example.samples)!
    const { events } = metricNotes[key]
    const { data, view } = traceOfNote(trace, { events, phase: null })
    expect(data.events.length).toBeGreaterThan(0)
    for (const { key: shown, timeS } of data.events) {
      expect(events).toContain(shown)
      expect(timeS).toBeGreaterThanOrEqual(view.startS)
      expect(timeS).toBeLessThanOrEqual(view.endS)
    }
  })

  test('marks where the athlete is weighed: a stretch of the quiet stance, before the onset', () => {
    const { cmj } = examples
    const span = weighedWindow(cmj, 'systemWeight')!
    expect(span.endS - span.startS).toBeCloseTo(1, 1)
    expect(span.endS).toBeLessThanOrEqual(cmj.analysis.events.onset!.timeS)
    const trace = traceDataOf(cmj, cmj.samples)!
    const { data, view } = traceOfNote(trace, { events: ['onset'], phase: null, span })
    expect(data).toMatchObject({ span, events: [] })
    expect(view.startS).toBeLessThanOrEqual(span.startS)
    expect(view.endS).toBeGreaterThan(span.endS)
    expect(weighedWindow(cmj, 'takeoffVelocity')).toBeNull()
  })

  test('of a file without a jump is not made up', () => {
    const { test: asked } = sampleRecordings.cmj
    expect(() => workOut(new TextEncoder().encode('nothing'), 'x.csv', asked)).toThrow()
  })
})
