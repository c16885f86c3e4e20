import { wordsOf } from '../columns/heading.ts'
import { shown } from '../safe-text.ts'
import { readDate } from './dates.ts'
import { readNumber } from './number-text.ts'
import type { DecimalMark } from './number-text.ts'
import type { TopRow } from './table.ts'

/** What the lines above the headings say of a recording, as far as they were recognised; made safe to show. */
export interface Metadata {
  /** Of the samples, Hz. */
  sampleRateHz?: number
  /** Of frames that hold several samples, Hz. */
  frameRateHz?: number
  /** As ISO 8601, with the time of day where it is written. Absent where day and month could be swapped. */
  recordedAt?: string
  athlete?: string
  bodyMassKg?: number
  test?: string
  /** Lines that said any of this. */
  lines: number[]
}

const list = (text: string): Set<string> => new Set(text.split('|'))

/** Keys as people write them, lower case, without accents and marks. */
const RATE_KEYS = list(
  'sample rate|sampling rate|sampling frequency|sample frequency|samplerate|rate|frequency|acquisition rate|analog rate|hz|fs|freq' +
    '|abtastrate|abtastfrequenz|messrate|frequenz|frecuencia|frecuencia de muestreo|frequence|frequence d echantillonnage|frequenza|frequenza di campionamento|frequencia',
)
const FRAME_RATE_KEYS = list('frame rate|camera rate|video rate|framerate|bildrate')
const DATE_KEYS = list(
  'date|recorded|recorded on|recorded at|recording date|test date|date of test|datum|messdatum|fecha|data|date time|datetime|date and time',
)
const TIME_OF_DAY_KEYS = list('time|time of day|start time|uhrzeit|hora|heure|ora')
const ATHLETE_KEYS = list(
  'athlete|athlete name|name|subject|subject name|player|player name|participant|person|athlet|athletin|sportler|probandin|proband|atleta|nombre|nom|athlete id|subject id',
)
const MASS_KEYS = list(
  'mass|body mass|bodymass|weight|body weight|bodyweight|athlete mass|athlete weight|masse|korpermasse|gewicht|korpergewicht|masa|peso|poids',
)
const TEST_KEYS = list(
  'test|test type|protocol|movement|exercise|trial|trial type|jump type|testart|ubung|prueba|ejercicio|epreuve|prova',
)

const POUND_KG = 0.45359237
const STANDARD_GRAVITY = 9.80665
/** What a person weighs and a plate samples at: anything else is another figure. */
const MASS_KG = { least: 10, greatest: 400 }
const RATE_HZ = { least: 20, greatest: 100_000 }

/** A line's key and value: `Rate: 1000 Hz`, `Rate = 1000`, `Rate;1000;Hz`, `# Rate (Hz), 1000`. */
function keyAndValue(row: TopRow): { key: string; value: string; unit: string } | null {
  const cells = row.cells.map((cell) => cell.trim()).filter((cell) => cell !== '')
  const [first = '', second, third = ''] = cells
  const glued = /^[#%;/*\s]*([^:=]{1,40}?)\s*[:=]\s*(\S.*)$/u.exec(first)
  const pair = glued
    ? { key: glued[1] ?? '', value: [glued[2], ...cells.slice(1)].join(' '), unit: cells[1] ?? '' }
    : second === undefined
      ? null
      : { key: first.replace(/[:=]$/u, ''), value: second, unit: third }
  if (!pair || pair.key.length > 40) return null
  const unitInKey = /[([{]([^)\]}]*)[)\]}]/u.exec(pair.key)
  return {
    key: wordsOf(pair.key.replace(/[([{].*$/u, '')).join(' '),
    value: pair.value.slice(0, 200),
    unit: (unitInKey?.[1] ?? pair.unit).trim(),
  }
}

/** The number a value begins with and the unit after it. */
function measure(value: string, unit: string, decimal: DecimalMark): { number: number; unit: string } {
  const parts = /^([+-]?[\d.,'’\u00A0]+)\s*(.*)$/u.exec(value)
  const text = parts?.[1] ?? ''
  // A line above a table need not be written as its numbers are.
  const own = readNumber(text, decimal)
  const number = Number.isNaN(own) ? readNumber(text, decimal === '.' ? ',' : '.') : own
  return { number, unit: (parts?.[2] || unit).trim().toLowerCase() }
}

function rateFrom(value: string, unit: string, decimal: DecimalMark): number | undefined {
  const measured = measure(value, unit, decimal)
  const factor = /^k/u.test(measured.unit) ? 1000 : 1
  if (measured.unit !== '' && !/^(?:k?hz|k?samples?\b|fps|1\/s|s-1|s\^-1)/u.test(measured.unit))
    return undefined
  const rate = measured.number * factor
  return rate >= RATE_HZ.least && rate <= RATE_HZ.greatest ? rate : undefined
}

/** Kilograms; a weight that is said in newtons or pounds is turned into them, one without a unit is not taken. */
function massFrom(value: string, unit: string, decimal: DecimalMark): number | undefined {
  const measured = measure(value, unit, decimal)
  const factor = /^(?:kg|kilo)/u.test(measured.unit)
    ? 1
    : /^(?:lb|pound)/u.test(measured.unit)
      ? POUND_KG
      : /^n(?:ewtons?)?$/u.test(measured.unit)
        ? 1 / STANDARD_GRAVITY
        : NaN
  const mass = measured.number * factor
  return mass >= MASS_KG.least && mass <= MASS_KG.greatest ? mass : undefined
}

/** What one line says, of which nothing is in `found` yet. */
function factIn(row: TopRow, decimal: DecimalMark, found: Metadata): Partial<Metadata> {
  const pair = keyAndValue(row)
  if (!pair) return {}
  const { key, value, unit } = pair
  if (RATE_KEYS.has(key)) return { sampleRateHz: rateFrom(value, unit, decimal) }
  if (FRAME_RATE_KEYS.has(key)) return { frameRateHz: rateFrom(value, unit, decimal) }
  if (MASS_KEYS.has(key)) return { bodyMassKg: massFrom(value, unit, decimal) }
  if (DATE_KEYS.has(key)) return { recordedAt: readDate(`${value} ${unit}`) ?? readDate(value) ?? undefined }
  if (TIME_OF_DAY_KEYS.has(key) && found.recordedAt?.length === 10) return withTime(found.recordedAt, value)
  if (ATHLETE_KEYS.has(key)) return { athlete: shown(value) }
  if (TEST_KEYS.has(key)) return { test: shown(value) }
  return {}
}

function withTime(date: string, value: string): Partial<Metadata> {
  const time = /^([01]?\d|2[0-3]):([0-5]\d)(?::([0-5]\d))?/u.exec(value)
  if (!time) return {}
  return { recordedAt: `${date}T${(time[1] ?? '').padStart(2, '0')}:${time[2] ?? ''}:${time[3] ?? '00'}` }
}

/** Reads what is recognised in the rows above the headings; the first line that says a thing counts. */
export function readMetadata(rows: readonly TopRow[], decimal: DecimalMark): Metadata {
  const found: Metadata = { lines: [] }
  for (const row of rows) {
    const facts = Object.entries(factIn(row, decimal, found)).filter(([, value]) => value !== undefined)
    for (const [name, value] of facts) {
      if (name !== 'recordedAt' && Object.hasOwn(found, name)) continue
      Object.assign(found, { [name]: value })
      found.lines.push(row.line)
    }
  }
  return found
}
