import type { TrialCheck, Verdict } from '../types.ts'
import { checkDefinitions, type CheckKey } from './check-definitions.ts'

/** What is said for each verdict of a check. */
export interface Wording {
  pass: string
  caution?: string
  fail?: string
  /** Where it is not the check's own. */
  remedy?: string
}

/** Puts a check together: the sentence is the verdict's, the remedy is asked for only where something is wrong. */
export function check(
  key: CheckKey,
  verdict: Verdict,
  figures: { measured: number | null; limit: number | null; unit: string },
  wording: Wording,
  affects = checkDefinitions[key].affects,
): TrialCheck {
  return {
    key,
    verdict,
    affects,
    ...figures,
    sentence: wording[verdict] ?? wording.fail ?? wording.caution ?? wording.pass,
    remedy: verdict === 'pass' ? '' : (wording.remedy ?? checkDefinitions[key].remedy),
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
