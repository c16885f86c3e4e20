import { readFileSync } from 'node:fs'
import { parseArgs } from 'node:util'
import { defaultSettings } from '../../shared/mechanics/settings.ts'
import type { Settings } from '../../shared/mechanics/settings.ts'
import { methodChoiceKeys, methodChoices } from '../../shared/mechanics/settings/choices.ts'
import { analysedProtocols } from '../../shared/mechanics/protocols/analysed.ts'
import type { Protocol, Side } from '../../shared/mechanics/types.ts'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { columnMapSchema } from '../../shared/contracts/column-map.ts'
import type { ColumnMap } from '../../shared/recordings/result.ts'
import type { GivenFacts } from './analysis-document.ts'

export const usage = `Usage: npm run --silent analyse -- FILE… [options]

Reads recordings as the server does and prints one JSON document with their figures.

  --protocol cmj     the test: ${analysedProtocols.join(', ')}; without it the engine proposes one and says so
  --side both        both, left or right
  --box 0.3          height of the box in metres, of a drop jump or landing
  --load 20          external load in kilograms
  --mass 81.5        the athlete's body mass in kilograms, checked against the weighing
  --rate 1000        sampling rate in hertz, for files without a time column
  --map MAP.json     the column map to read the files by, as "columnMap" of this document shows one
  --settings S.json  settings of the engine to change, by name
  --summary          a line for each trial instead of the document

Exit status: 0 when every file was read, 2 when any was not, 1 when the command was not understood.`

/** The command was not understood; the message says what and how it goes. */
export class UsageError extends Error {}

export interface AnalyseArguments {
  files: string[]
  given: GivenFacts
  settings: Settings
  summary: boolean
}

const options = {
  protocol: { type: 'string' },
  side: { type: 'string' },
  box: { type: 'string' },
  load: { type: 'string' },
  mass: { type: 'string' },
  rate: { type: 'string' },
  map: { type: 'string' },
  settings: { type: 'string' },
  summary: { type: 'boolean' },
} as const

function parse(
  args: string[],
): ReturnType<typeof parseArgs<{ options: typeof options; allowPositionals: true }>> {
  try {
    return parseArgs({ args, options, allowPositionals: true })
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error))
  }
}

function number(name: string, text: string | undefined, from: number, to: number): number | undefined {
  if (text === undefined) return undefined
  const value = Number(text)
  if (text.trim() === '' || !(value >= from && value <= to)) {
    throw new UsageError(`--${name} takes a number from ${from} to ${to}, and “${text}” was given.`)
  }
  return value
}

const isSide = (text: string): text is Side => text === 'both' || text === 'left' || text === 'right'

function protocolFrom(text: string): Protocol {
  const protocol = analysedProtocols.find((known) => known === text)
  if (protocol) return protocol
  throw new UsageError(`--protocol takes ${analysedProtocols.join(', ')}, and “${text}” was given.`)
}

/** The test, where it is named; else what is known of it. */
function testFrom(values: ReturnType<typeof parse>['values']): Pick<GivenFacts, 'test' | 'known'> {
  const { protocol, side } = values
  if (side !== undefined && !isSide(side))
    throw new UsageError(`--side takes both, left or right, and “${side}” was given.`)
  const load = number('load', values.load, 0, 500)
  const box = number('box', values.box, 0.01, 2)
  const known = {
    ...(side === undefined ? {} : { side }),
    ...(load === undefined ? {} : { externalLoadKg: load }),
    ...(box === undefined ? {} : { boxHeightM: box }),
  }
  if (protocol !== undefined) return { test: { ...usualTest(protocolFrom(protocol)), ...known } }
  return Object.keys(known).length === 0 ? {} : { known }
}

/** The engine's settings with those that a file of `{ name: number }` changes. */
function settingsFrom(path: string | undefined): Settings {
  if (path === undefined) return defaultSettings
  const changes = readObject(path, 'settings by name')
  for (const [name, value] of Object.entries(changes)) {
    const known = Object.hasOwn(defaultSettings, name) && name !== 'version'
    if (!known) throw new UsageError(`${path}: “${name}” is no setting of the engine.`)
    const options = methodChoiceKeys.find((key) => key === name)
    const fits = options
      ? typeof value === 'string' && Object.hasOwn(methodChoices[options].options, value)
      : Number.isFinite(value)
    if (!fits) throw new UsageError(`${path}: the setting “${name}” cannot be ${JSON.stringify(value)}.`)
  }
  return { ...defaultSettings, ...changes }
}

/** The object that a file of JSON holds. */
function readObject(path: string, what: string): Record<string, unknown> {
  let changes: unknown
  try {
    changes = JSON.parse(readFileSync(path, 'utf8'))
  } catch (error) {
    throw new UsageError(
      `${path} could not be read as JSON: ${error instanceof Error ? error.message : String(error)}`,
    )
  }
  if (typeof changes !== 'object' || changes === null || Array.isArray(changes)) {
    throw new UsageError(`${path} must hold an object: ${what}.`)
  }
  return changes as Record<string, unknown>
}

/** The column map in a file. */
function mapFrom(path: string): ColumnMap {
  const { data, error } = columnMapSchema.safeParse(readObject(path, 'a column map'))
  if (data) return data
  const [issue] = error.issues
  throw new UsageError(`${path} is no column map: ${issue?.path.join('.') ?? ''} ${issue?.message ?? ''}`)
}

/** @throws UsageError with a sentence for whoever typed the command */
export function readArguments(args: string[]): AnalyseArguments {
  const { values, positionals } = parse(args)
  if (positionals.length === 0) throw new UsageError('Name at least one file.')
  const massKg = number('mass', values.mass, 10, 400)
  const sampleRateHz = number('rate', values.rate, 1, 100_000)
  return {
    files: positionals,
    given: {
      ...testFrom(values),
      ...(massKg === undefined ? {} : { massKg }),
      ...(sampleRateHz === undefined ? {} : { sampleRateHz }),
      ...(values.map === undefined ? {} : { map: mapFrom(values.map) }),
    },
    settings: settingsFrom(values.settings),
    summary: values.summary ?? false,
  }
}
