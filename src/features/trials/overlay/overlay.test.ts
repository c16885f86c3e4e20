import { describe, expect, test } from 'vitest'
import type { ResultPoint } from '../../../../shared/contracts/results.ts'
import { idOf } from '../../../../tests/setup/msw/ids.ts'
import { aTrial, measuredJump } from '../../../../tests/setup/msw/measured.ts'
import { overlayChoices } from './overlay-choices.ts'
import { overlayOf } from './overlay-of.ts'

const jump = measuredJump()
const other = measuredJump({ stanceS: 1.2 }, 2)
const trial = aTrial(jump)
const laid = { trial: aTrial(other, { id: idOf('trial', 2) }), samples: other.recording.channels }

describe('what can be laid over a trial', () => {
  const result = (n: number, date: string, load = 0): ResultPoint => ({
    sessionId: idOf('session', n),
    date,
    sessionTitle: `Session ${n}`,
    test: { ...trial.test, externalLoadKg: load },
    trialIds: [idOf('trial', 10 * n), idOf('trial', 10 * n + 1)],
    means: {},
  })

  test('the athlete’s other trials of the same test, newest session first', () => {
    const results = [result(1, '2026-10-01'), result(2, '2026-11-01'), result(3, '2026-11-01', 20)]
    const words = overlayChoices({ id: idOf('trial', 11), test: trial.test }, results).map((one) => one.words)
    expect(words).toEqual([
      '1 Nov 2026, Session 2, jump 1',
      '1 Nov 2026, Session 2, jump 2',
      '1 Oct 2026, Session 1, jump 1',
    ])
  })
})

describe('a trial laid over another', () => {
  test.each(['takeoff', 'onset'] as const)('has its %s where the other has it', (alignAt) => {
    const overlay = overlayOf(laid, trial, alignAt, 'A')!
    const at = overlay.startS + other.analysis.events[alignAt]!.timeS
    expect(at).toBeCloseTo(jump.analysis.events[alignAt]!.timeS, 12)
  })

  test('is not drawn where one of the two has no such event', () => {
    const without = { ...other.analysis, events: {} }
    expect(
      overlayOf({ ...laid, trial: { ...laid.trial, analysis: without } }, trial, 'onset', 'A'),
    ).toBeNull()
    expect(overlayOf(laid, { analysis: null }, 'onset', 'A')).toBeNull()
  })
})
