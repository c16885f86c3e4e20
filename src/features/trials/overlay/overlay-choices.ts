import type { ResultPoint } from '../../../../shared/contracts/results.ts'
import { testKey } from '../../../../shared/contracts/tests.ts'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { formatDateShort } from '../../../lib/format-date.ts'

export interface OverlayChoice {
  trialId: string
  /** "12 Nov 2026, November jumps, jump 2" */
  words: string
}

/** The athlete's other trials of the same test that count, newest session first. */
export function overlayChoices(
  { id, test }: Pick<Trial, 'id' | 'test'>,
  results: readonly ResultPoint[],
): OverlayChoice[] {
  const same = results.filter((result) => testKey(result.test) === testKey(test))
  return [...same]
    .reverse()
    .flatMap(({ date, sessionTitle, trialIds }) =>
      trialIds.flatMap((trialId, i) =>
        trialId === id
          ? []
          : [{ trialId, words: `${formatDateShort(date)}, ${sessionTitle}, jump ${i + 1}` }],
      ),
    )
}
