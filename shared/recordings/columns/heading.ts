import type { ForceUnit, TimeUnit } from '../column-map.ts'
import {
  AXIS_WORDS,
  FORCE_UNITS,
  FORCE_WORDS,
  HORIZONTAL_WORDS,
  LEFT_WORDS,
  MASS_SPELLINGS,
  OTHER_UNITS,
  OTHER_WORDS,
  PART_WORDS,
  RIGHT_WORDS,
  SAMPLE_WORDS,
  TIME_UNITS,
  TIME_WORDS,
  TOTAL_WORDS,
  VERTICAL_WORDS,
  WITHIN_WORDS,
} from './heading-words.ts'

/** The unit a heading names: one that is read, another one in its own spelling, or none. */
export type HeadingUnit =
  | { family: 'force'; unit: ForceUnit; isMass?: true }
  | { family: 'time'; unit: TimeUnit }
  | { family: 'other'; text: string }
  | { family: 'none' }

export type Quantity = 'time' | 'sample' | 'within' | 'force' | 'other'

/** What one column heading says. */
export interface Heading {
  /** As written, blanks collapsed. */
  name: string
  unit: HeadingUnit
  quantity: Quantity
  foot: 'left' | 'right' | 'total' | null
  /** `up`: said in words. A letter names an axis, which need not be the upright one. */
  axis: 'x' | 'y' | 'z' | 'up' | 'level' | null
  /** The words without those that say which part of one plate it is. */
  stem: string
  /** The words without the one that says which axis it is: what the components of one plate share. */
  plate: string
  isPart: boolean
}

const NO_UNIT: HeadingUnit = { family: 'none' }

/** A heading longer than this is none; it also bounds the work of the patterns below. */
const LONGEST_HEADING = 200

/** The unit that a piece of text is, if it is nothing but a unit. */
export function unitOf(text: string): HeadingUnit {
  const key = text.trim().replace(/\s+/gu, '').toLowerCase()
  const force = FORCE_UNITS.get(key)
  if (force)
    return MASS_SPELLINGS.has(key)
      ? { family: 'force', unit: force, isMass: true }
      : { family: 'force', unit: force }
  const time = TIME_UNITS.get(key)
  if (time) return { family: 'time', unit: time }
  return OTHER_UNITS.has(key) ? { family: 'other', text: text.trim() } : NO_UNIT
}

/** `Force [N]`, `Force (N) left`: a unit in any brackets. */
function bracketedUnit(text: string): { unit: HeadingUnit; rest: string } | null {
  for (const match of text.matchAll(/[([{<]([^)\]}>]*)[)\]}>]/gu)) {
    const unit = unitOf(match[1] ?? '')
    if (unit.family !== 'none') return { unit, rest: text.replace(match[0], ' ') }
  }
  return null
}

/** `Force/N`, `Force in N`, `force_N`, `Force N`, `forceN`, or the unit alone. */
function trailingUnit(text: string): { unit: HeadingUnit; rest: string } {
  const whole = unitOf(text)
  if (whole.family !== 'none') return { unit: whole, rest: '' }
  const last =
    /^(.*\S)\s*\/\s*(\S+)$/u.exec(text) ??
    /^(.*\S)[\s_,;:.-]+([A-Za-z%]+)$/u.exec(text) ??
    // Glued on, a unit shows by its capital only: "forceN", but not "forces".
    /^(.*[a-z])(N|kN|Ms|Sec)$/u.exec(text)
  const unit = unitOf(last?.[2] ?? '')
  if (!last || unit.family === 'none' || (unit.family === 'time' && unit.unit === 'samples'))
    return { unit: NO_UNIT, rest: text }
  return { unit, rest: last[1] ?? '' }
}

/** Lower-case words of a heading, accents folded, split at marks, capitals and figures. */
export function wordsOf(text: string): string[] {
  return text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/([a-z])([A-Z])/gu, '$1 $2')
    .replace(/([A-Z]+)([A-Z][a-z])/gu, '$1 $2')
    .replace(/(\p{L})(\p{N})/gu, '$1 $2')
    .replace(/(\p{N})(\p{L})/gu, '$1 $2')
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '')
}

const hasAny = (texts: readonly string[], set: Set<string>): boolean => texts.some((word) => set.has(word))

function footOf(texts: string[]): Heading['foot'] {
  const left = hasAny(texts, LEFT_WORDS)
  const right = hasAny(texts, RIGHT_WORDS)
  if (hasAny(texts, TOTAL_WORDS) || (left && right)) return 'total'
  if (left) return 'left'
  return right ? 'right' : null
}

function axisOf(texts: string[]): Heading['axis'] {
  if (hasAny(texts, VERTICAL_WORDS)) return 'up'
  if (hasAny(texts, HORIZONTAL_WORDS)) return 'level'
  const letter = texts.find((word) => AXIS_WORDS.has(word))
  return (letter === undefined ? undefined : AXIS_WORDS.get(letter)) ?? null
}

function countsSamples(texts: string[], unit: HeadingUnit): Quantity | null {
  if (unit.family === 'time' && unit.unit === 'samples') return 'sample'
  if (unit.family !== 'none') return null
  if (hasAny(texts, WITHIN_WORDS)) return 'within'
  return hasAny(texts, SAMPLE_WORDS) && !hasAny(texts, FORCE_WORDS) && !hasAny(texts, TIME_WORDS)
    ? 'sample'
    : null
}

function quantityOf(
  texts: string[],
  unit: HeadingUnit,
  foot: Heading['foot'],
  axis: Heading['axis'],
): Quantity {
  if (hasAny(texts, OTHER_WORDS)) return 'other'
  const counted = countsSamples(texts, unit)
  if (counted) return counted
  if (unit.family === 'force') return 'force'
  if (unit.family === 'time') return texts.length === 0 || hasAny(texts, TIME_WORDS) ? 'time' : 'other'
  if (hasAny(texts, FORCE_WORDS)) return 'force'
  if (unit.family === 'none' && hasAny(texts, TIME_WORDS)) return 'time'
  const names = foot !== null || (axis !== null && texts.some((word) => /^(?:f|grf|r)[xyz]$/u.test(word)))
  return unit.family === 'none' && (names || axis === 'up') ? 'force' : 'other'
}

/** Reads a column heading; `unitBelow` is the text of a row of units beside it, if there is one. */
export function readHeading(cell: string, unitBelow = ''): Heading {
  const name = cell.slice(0, LONGEST_HEADING).replace(/\s+/gu, ' ').trim()
  const below = unitOf(unitBelow.slice(0, LONGEST_HEADING).replace(/[()[\]{}<>]/gu, ''))
  const own = bracketedUnit(name) ?? trailingUnit(name)
  const unit = own.unit.family === 'none' ? below : own.unit
  const texts = wordsOf(own.unit.family === 'none' ? name : own.rest)
  const foot = footOf(texts)
  const axis = axisOf(texts)
  const isAxis = (word: string): boolean =>
    AXIS_WORDS.has(word) || FORCE_WORDS.has(word) || VERTICAL_WORDS.has(word) || HORIZONTAL_WORDS.has(word)
  return {
    name,
    unit,
    quantity: quantityOf(texts, unit, foot, axis),
    foot,
    axis,
    stem: texts.filter((word) => !PART_WORDS.has(word)).join(' '),
    plate: texts.filter((word) => !isAxis(word)).join(' '),
    isPart: hasAny(texts, PART_WORDS),
  }
}
