import type { Trial } from '../../../shared/contracts/trials.ts'
import { formatNumber } from '../../lib/format-figure.ts'
import { figureWords } from '../results/metric-words.ts'

/** What the trace shows, in sentences: for those who do not see it, and a guide for those who do. */
export function traceSummary({ analysis }: Pick<Trial, 'analysis'>): string {
  if (!analysis) return 'The force over the whole recording. It is being analysed.'
  const { events, metrics } = analysis
  const at = (event: { timeS: number } | undefined) => (event ? `at ${formatNumber(event.timeS, 2)} s` : null)
  const said = (key: string) => (metrics[key] ? figureWords(key, metrics[key]) : null)
  const sentence = (words: string, ...needed: (string | null)[]) => (needed.includes(null) ? [] : [words])
  const takeoff = at(events.takeoff)
  return [
    ...sentence(`Standing still: ${said('systemWeight')}.`, said('systemWeight')),
    ...sentence(`The movement begins ${at(events.onset)}`, at(events.onset)).map((begun) =>
      events.zeroVelocity ? `${begun} and is lowest ${at(events.zeroVelocity)}.` : `${begun}.`,
    ),
    ...sentence(
      `The feet leave the ground ${takeoff} with a momentum of ${said('takeoffMomentum')}.`,
      takeoff,
      said('takeoffMomentum'),
    ),
    ...sentence(
      `They touch down ${at(events.touchdown)}; the landing peaks at ${said('landingPeakForce')}.`,
      at(events.touchdown),
      said('landingPeakForce'),
    ),
    ...sentence(`The athlete stands still again ${at(events.still)}.`, at(events.still)),
  ].join(' ')
}
