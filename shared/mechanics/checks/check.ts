import type { MetricGroup, TrialCheck, Verdict } from '../types.ts'

/** Every group of figures. */
export const allGroups: MetricGroup[] = [
  'weighing',
  'jump',
  'impulse',
  'push',
  'flight',
  'landing',
  'sides',
  'ledger',
]

/** All that rests on the jump: everything but the weighing. */
export const allButWeighing = allGroups.filter((group) => group !== 'weighing')

/** What only the time after takeoff can spoil. */
export const afterTakeoff: MetricGroup[] = ['flight', 'landing', 'ledger']

/** What is said for each verdict of a check. */
export interface Wording {
  pass: string
  caution?: string
  fail?: string
  remedy: string
}

/** Puts a check together: the sentence is the verdict's, the remedy is asked for only where something is wrong. */
export function check(
  key: string,
  verdict: Verdict,
  affects: MetricGroup[],
  figures: { measured: number | null; limit: number | null; unit: string },
  wording: Wording,
): TrialCheck {
  return {
    key,
    verdict,
    affects,
    ...figures,
    sentence: wording[verdict] ?? wording.fail ?? wording.caution ?? wording.pass,
    remedy: verdict === 'pass' ? '' : wording.remedy,
  }
}

/** Verdict on a size with a limit for caution and one for failure; what cannot be measured fails. */
export function verdictOn(size: number, caution: number, fail: number): Verdict {
  if (!(size <= fail)) return 'fail'
  return size <= caution ? 'pass' : 'caution'
}

/** A figure rounded for a sentence. */
export function rounded(value: number, decimals: number): string {
  return value.toFixed(decimals)
}
