import { expect, test } from 'vitest'
import { measuredJump } from '../../../tests/setup/msw/measured.ts'
import { traceSummary } from './trace-summary.ts'

const { analysis } = measuredJump()
const fail = {
  ...analysis.checks[0]!,
  key: 'closing-balance',
  verdict: 'fail' as const,
  affects: ['landing' as const],
  sentence: 'Stepped off.',
}

test('the summary of a trace names weight, instants, momentum and landing peak', () => {
  const said = traceSummary({ analysis })
  expect(said).toMatch(/^Standing still: [\d.]+ ±\s[\d.]+ N\. The movement begins at/)
  expect(said).toMatch(/leave the ground at [\d.]+ s with a momentum of [\d.]+ ±\s[\d.]+ kg·m\/s\./)
  expect(said).toMatch(/the landing peaks at .* N\. The athlete stands still again at [\d.]+ s\.$/)
})

test('a figure that a failed check takes away is left out, with the reason', () => {
  const said = traceSummary({
    analysis: { ...analysis, checks: [fail], withheld: ['landingPeakForce'] },
  })
  expect(said).not.toContain('the landing peaks at')
  expect(said).toMatch(/The feet touch down at [\d.]+ s\. /)
  expect(said).toMatch(/Left out because a check failed: landing peak force\. Stepped off\.$/)
})

test('a trial that is not analysed yet says so', () => {
  expect(traceSummary({ analysis: null })).toContain('being analysed')
})
