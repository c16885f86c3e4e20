import { catalogue } from '../../shared/mechanics/catalogue.ts'
import type { MetricKey } from '../../shared/mechanics/catalogue.ts'
import { protocolNames } from '../../shared/mechanics/protocols/names.ts'
import type { FileEntry } from './analysis-document.ts'

/** What a line shows of a trial. */
const SHOWN: readonly MetricKey[] = [
  'bodyMass',
  'jumpHeightImpulse',
  'takeoffVelocity',
  'contactTime',
  'rsi',
  'rsiBestFive',
  'contactTimeMean',
  'landingPeakForce',
]

type Trial = FileEntry['trials'][number]

function figureText({ metrics }: Trial, key: MetricKey): string {
  const { name, display } = catalogue[key]
  const figure = metrics[key]
  if (!figure) return `${name} –`
  const shown = (value: number): string => (value * display.factor).toFixed(display.decimals)
  const uncertainty = figure.U === null ? '' : ` ± ${shown(figure.U)}`
  return `${name} ${shown(figure.value)}${uncertainty} ${display.unit}`
}

function trialLine(trial: Trial): string {
  const failed = trial.checks.filter((check) => check.verdict === 'fail').map((check) => check.key)
  const shown = SHOWN.filter((key) => catalogue[key].protocols.includes(trial.protocol))
  const figures = [protocolNames[trial.protocol], ...shown.map((key) => figureText(trial, key))].join(' · ')
  return failed.length > 0 ? `${figures} · failed: ${failed.join(', ')}` : figures
}

/** A line for each trial of a file, or one that says why there is none. */
export function summaryLines({ file, trials, error, notes }: FileEntry): string[] {
  if (error) return [`${file}: ${error.sentence} ${error.remedy}`]
  if (trials.length === 0) return [`${file}: ${notes.at(-1)?.sentence ?? 'No trial was found.'}`]
  return trials.map((trial) => `${file}: ${trialLine(trial)}`)
}
