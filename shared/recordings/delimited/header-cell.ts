import type { ForceUnit, TimeUnit } from '../result.ts'
import {
  FORCE_UNITS,
  FORCE_WORDS,
  LEFT_WORDS,
  OTHER_UNITS,
  OTHER_WORDS,
  PART_WORDS,
  RIGHT_WORDS,
  TIME_UNITS,
  TIME_WORDS,
  TOTAL_WORDS,
  VERTICAL_WORDS,
} from './header-words.ts'

/** The unit a heading names: one that is read, another one in its own spelling, or none. */
export type HeadingUnit =
  | { family: 'force'; unit: ForceUnit }
  | { family: 'time'; unit: TimeUnit }
  | { family: 'other'; text: string }
  | { family: 'none' }

/** What one column heading says. */
export interface Heading {
  /** As written, blanks collapsed. */
  name: string
  unit: HeadingUnit
  quantity: 'time' | 'force' | 'other'
  foot: 'left' | 'right' | 'total' | null
  vertical: boolean
  /** The words without those that say which part of one plate it is. */
  stem: string
  isPart: boolean
}

const NO_UNIT: HeadingUnit = { family: 'none' }

/** A heading longer than this is none; it also bounds the work of the patterns below. */
const LONGEST_HEADING = 200

/** The unit that a piece of text is, if it is nothing but a unit. */
export function unitOf(text: string): HeadingUnit {
  const key = text.trim().replace(/\s+/gu, '').toLowerCase()
  const force = FORCE_UNITS.get(key)
  if (force) return { family: 'force', unit: force }
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
  if (!last || unit.family === 'none') return { unit: NO_UNIT, rest: text }
  return { unit, rest: last[1] ?? '' }
}

/** Lower-case words of a heading, accents folded, split at marks, capitals and figures. */
function wordsOf(text: string): string[] {
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

function footOf(words: string[]): Heading['foot'] {
  const left = words.some((word) => LEFT_WORDS.has(word))
  const right = words.some((word) => RIGHT_WORDS.has(word))
  if (words.some((word) => TOTAL_WORDS.has(word)) || (left && right)) return 'total'
  if (left) return 'left'
  return right ? 'right' : null
}

function quantityOf(words: string[], unit: HeadingUnit, foot: Heading['foot']): Heading['quantity'] {
  const has = (set: Set<string>): boolean => words.some((word) => set.has(word))
  if (has(OTHER_WORDS)) return 'other'
  if (unit.family === 'force') return 'force'
  if (unit.family === 'time') return words.length === 0 || has(TIME_WORDS) ? 'time' : 'other'
  if (has(FORCE_WORDS)) return 'force'
  if (unit.family === 'none' && has(TIME_WORDS)) return 'time'
  return unit.family === 'none' && foot !== null ? 'force' : 'other'
}

/** Reads a column heading; `unitBelow` is the text of a row of units under it, if there is one. */
export function readHeading(cell: string, unitBelow = ''): Heading {
  const name = cell.slice(0, LONGEST_HEADING).replace(/\s+/gu, ' ').trim()
  const below = unitOf(unitBelow.slice(0, LONGEST_HEADING).replace(/[()[\]{}<>]/gu, ''))
  const own = bracketedUnit(name) ?? trailingUnit(name)
  const unit = own.unit.family === 'none' ? below : own.unit
  const words = wordsOf(own.unit.family === 'none' ? name : own.rest)
  const foot = footOf(words)
  return {
    name,
    unit,
    quantity: quantityOf(words, unit, foot),
    foot,
    vertical: words.some((word) => VERTICAL_WORDS.has(word)),
    stem: words.filter((word) => !PART_WORDS.has(word)).join(' '),
    isPart: words.some((word) => PART_WORDS.has(word)),
  }
}
