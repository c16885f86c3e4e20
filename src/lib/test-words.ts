import type { z } from 'zod'
import { protocolNames, type Arms, type Side, type Test } from '../../shared/contracts/tests.ts'
import { protocolsWithArms } from '../../shared/contracts/session-test.ts'
import type { Protocol as AnyProtocol } from '../../shared/mechanics/types.ts'
import { formatNumber } from './format-figure.ts'

export const armsWords: Record<z.infer<typeof Arms>, string> = { hips: 'hands on hips', free: 'arms free' }
export const sideWords: Record<z.infer<typeof Side>, string> = {
  both: 'both feet',
  left: 'left leg',
  right: 'right leg',
}

/** What was carried, and from how high a fall began: "20 kg load", "30 cm box"; empty where there is neither. */
export function testParticulars({ externalLoadKg, boxHeightM }: z.infer<typeof Test>): string {
  const parts = [
    ...(externalLoadKg > 0 ? [`${formatNumber(externalLoadKg, 1)} kg load`] : []),
    ...(boxHeightM === null ? [] : [`${formatNumber(boxHeightM * 100, 0)} cm box`]),
  ]
  return parts.join(', ')
}

/** A test in words: "Countermovement jump, hands on hips", and what else makes it another test. */
export function testWords(test: z.infer<typeof Test>): string {
  const parts = [protocolNames[test.protocol]]
  if (protocolsWithArms.includes(test.protocol)) parts.push(armsWords[test.arms])
  if (test.side !== 'both') parts.push(sideWords[test.side])
  parts.push(testParticulars(test))
  return parts.filter(Boolean).join(', ')
}

/** What one trial of a test is called by those who did it. */
export const trialNouns: Readonly<Record<AnyProtocol, string>> = {
  cmj: 'jump',
  sj: 'jump',
  dj: 'jump',
  slcmj: 'jump',
  dropLanding: 'landing',
  hops: 'set of hops',
}
export const trialNounsOfMany: typeof trialNouns = {
  cmj: 'jumps',
  sj: 'jumps',
  dj: 'jumps',
  slcmj: 'jumps',
  dropLanding: 'landings',
  hops: 'sets of hops',
}

/** "set of hops" at the beginning of a line: "Set of hops". */
export const sentenceCase = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
