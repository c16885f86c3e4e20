import type { Analysis, Trial } from '../../../shared/contracts/trials.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { formatNumber } from '../../lib/format-figure.ts'
import { figureWords } from '../results/metric-words.ts'
import { withheldBecause } from './measured-groups.ts'

/** What the trace shows, in sentences: for those who do not see it, and a guide for those who do. */
export function traceSummary({ analysis }: Pick<Trial, 'analysis'>): string {
  if (!analysis) return 'The force over the whole recording. It is being analysed.'
  const { events, metrics, withheld, contacts } = analysis
  const at = (event: { timeS: number } | undefined) => (event ? `at ${formatNumber(event.timeS, 2)} s` : null)
  const said = (key: string) =>
    metrics[key] && !withheld.includes(key) ? figureWords(key, metrics[key]) : null
  const sentence = (words: string, ...needed: (string | null)[]) => (needed.includes(null) ? [] : [words])
  const takeoff = at(events.takeoff)
  const hops = contacts?.length ?? 0
  return [
    ...sentence(`Standing still: ${said('systemWeight')}.`, said('systemWeight')),
    ...sentence(`The movement begins ${at(events.onset)}`, at(events.onset)).map((begun) =>
      events.zeroVelocity ? `${begun} and is lowest ${at(events.zeroVelocity)}.` : `${begun}.`,
    ),
    ...sentence(`The feet come down from the box ${at(events.arrival)}.`, at(events.arrival)),
    ...sentence(
      `The feet leave the ground ${takeoff}${withFigure(' with a momentum of', said('takeoffMomentum'))}.`,
      takeoff,
    ),
    ...(hops > 1 ? [`Then come ${hops} contacts, each with a flight after it.`] : []),
    ...sentence(
      `The feet touch down ${at(events.touchdown)}${withFigure('; the landing peaks at', said('landingPeakForce'))}.`,
      at(events.touchdown),
    ),
    ...sentence(`The athlete stands still again ${at(events.still)}.`, at(events.still)),
    ...leftOut(analysis),
  ].join(' ')
}

const withFigure = (words: string, figure: string | null) => (figure === null ? '' : `${words} ${figure}`)

/** What the sentences would name, and why they do not. */
function leftOut(analysis: Analysis): string[] {
  const keys = ['systemWeight', 'takeoffMomentum', 'landingPeakForce'] as const
  const taken = keys.filter((key) => analysis.metrics[key] && analysis.withheld.includes(key))
  if (taken.length === 0) return []
  const names = taken.map((key) => catalogue[key].name.toLowerCase()).join(', ')
  const reasons = [...new Set(taken.map((key) => withheldBecause(key, analysis)))].join(' ')
  return [`Left out because a check failed: ${names}. ${reasons}`]
}
