import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { catalogue, metricKeys } from '../../../shared/mechanics/catalogue.ts'
import { checkKeys } from '../../../shared/mechanics/checks/check-definitions.ts'
import { traceDataOf } from '../trials/trace-data-of.ts'
import { metricNotes } from './notes/metric-notes.ts'
import { traceOfNote } from './trace-of-note.ts'
import { workOut } from './worked-example.ts'

const example = workOut(readFileSync('public/samples/two-plates.csv'), 'two-plates.csv')
const { analysis } = example
const trace = traceDataOf(example, example.samples)!
const ofThisTest = metricKeys.filter((key) => catalogue[key].protocols.includes(example.test.protocol))

describe('the worked example', () => {
  test.each(ofThisTest)('gives %s, and where it has no uncertainty the note says why', (key) => {
    const figure = analysis.metrics[key] ?? analysis.sides?.left[key]
    expect(figure).toBeDefined()
    if (figure!.U === null) expect(metricNotes[key].withoutU).toBeDefined()
  })

  test('runs into every check but those of other tests and the one that needs a recorded mass', () => {
    const met = new Set(analysis.checks.map(({ key }) => key))
    expect(checkKeys.filter((key) => !met.has(key))).toEqual([
      'mass-agreement',
      'side-agreement',
      'other-foot-off',
      'other-foot-landing',
      'squat-dip',
      'drop-height',
      'plausible-rebound',
      'hop-count',
      'hops-counted',
    ])
    expect(analysis.checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
  })

  test.each(ofThisTest)('shows where %s is read', (key) => {
    const { events } = metricNotes[key]
    const { data, view } = traceOfNote(trace, { events, phase: null })
    expect(data.events.map((event) => event.key).sort()).toEqual([...events].sort())
    for (const { timeS } of data.events) {
      expect(timeS).toBeGreaterThanOrEqual(view.startS)
      expect(timeS).toBeLessThanOrEqual(view.endS)
    }
  })

  test('of a file without a jump is not made up', () => {
    expect(() => workOut(new TextEncoder().encode('nothing'), 'x.csv')).toThrow()
  })
})
