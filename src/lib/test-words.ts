import type { z } from 'zod'
import { protocolNames, type Test } from '../../shared/contracts/tests.ts'
import { formatNumber } from './format-figure.ts'

/** A test in words: "Countermovement jump, hands on hips", and what else makes it another test. */
export function testWords(test: z.infer<typeof Test>): string {
  const parts = [protocolNames[test.protocol], test.arms === 'hips' ? 'hands on hips' : 'arms free']
  if (test.side !== 'both') parts.push(`${test.side} leg`)
  if (test.externalLoadKg > 0) parts.push(`${formatNumber(test.externalLoadKg, 1)} kg load`)
  if (test.boxHeightM !== null) parts.push(`${formatNumber(test.boxHeightM * 100, 0)} cm box`)
  return parts.join(', ')
}
