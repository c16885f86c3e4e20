import type { ForceChannel } from '../../mechanics/types.ts'
import type { ColumnMap, ForceUnit, TimeUnit } from '../column-map.ts'
import { shown } from '../safe-text.ts'
import type { Settled } from './draft.ts'
import { evenStep } from './content.ts'
import { timeUnitByStep } from './guess.ts'
import type { Heading } from './heading.ts'
import type { Columns } from './settle-map.ts'

/** What a column can be taken for. */
export type ColumnRole =
  | { kind: 'time'; unit: TimeUnit }
  | { kind: 'within-frame' }
  | { kind: 'force'; channel: ForceChannel; unit: ForceUnit }
  | { kind: 'unused' }

/** One column: what it is proposed to be, how sure that is and why, and what else it could be. */
export interface ColumnProposal {
  index: number
  /** Its heading, made safe to show; '' without one. */
  name: string
  role: ColumnRole
  /** 0 (a guess) to 1 (the heading says so). */
  confidence: number
  reasons: string[]
  /** Likeliest first. */
  alternatives: ColumnRole[]
}

/** A map to be confirmed or corrected, and why it is proposed. */
export interface MapProposal {
  map: ColumnMap
  /** That of its least sure column in use. */
  confidence: number
  columns: ColumnProposal[]
}

const GUESS = 0.4

/** The draft with what is open in it taken as it is likeliest. */
function completed({ draft }: Settled, { contentOf }: Columns): ColumnMap {
  const { time, forces } = draft
  const step = time && time.unit === null ? evenStep(contentOf(time.index)) : null
  const within = time?.within && {
    ...time.within,
    samplesPerFrame:
      Math.round(contentOf(time.within.index).greatest - contentOf(time.within.index).least) + 1,
  }
  return {
    time: time && {
      index: time.index,
      name: time.name,
      unit: time.unit ?? timeUnitByStep(step ?? NaN) ?? 's',
      ...(within ? { within } : {}),
    },
    forces: forces.map((force) => ({ ...force, unit: force.unit ?? 'N' })),
  }
}

function roleOf(index: number, map: ColumnMap): ColumnRole {
  if (map.time?.index === index) return { kind: 'time', unit: map.time.unit }
  if (map.time?.within?.index === index) return { kind: 'within-frame' }
  const force = map.forces.find((one) => one.index === index)
  return force ? { kind: 'force', channel: force.channel, unit: force.unit } : { kind: 'unused' }
}

function alternativesTo(role: ColumnRole, isNumeric: boolean, unit: ForceUnit): ColumnRole[] {
  if (!isNumeric) return []
  const channels: ForceChannel[] = ['left', 'right', 'single', 'total']
  const forces = channels
    .filter((channel) => role.kind !== 'force' || role.channel !== channel)
    .map((channel): ColumnRole => ({
      kind: 'force',
      channel,
      unit: role.kind === 'force' ? role.unit : unit,
    }))
  const times = (['s', 'ms', 'samples'] as const)
    .filter((timeUnit) => role.kind !== 'time' || role.unit !== timeUnit)
    .map((timeUnit): ColumnRole => ({ kind: 'time', unit: timeUnit }))
  const unused: ColumnRole[] = role.kind === 'unused' ? [] : [{ kind: 'unused' }]
  return role.kind === 'time' ? [...times, ...unused, ...forces] : [...forces, ...unused, ...times]
}

function reasonFor(role: ColumnRole, heading: Heading | undefined, isNumeric: boolean): [number, string] {
  if (!isNumeric) return [1, 'It holds no numbers.']
  const named = heading && heading.name !== ''
  if (role.kind === 'unused') {
    if (!named) return [GUESS, 'It has no heading.']
    return heading.quantity === 'force'
      ? [GUESS, 'Its heading names a force that found no place.']
      : [0.9, 'Its heading names neither time nor vertical force.']
  }
  if (!named)
    return [
      GUESS,
      role.kind === 'time'
        ? 'It has no heading, and rises evenly.'
        : 'It has no heading, and moves as a force does.',
    ]
  if (role.kind === 'within-frame' || (role.kind === 'time' && role.unit === 'samples'))
    return heading.quantity === 'other'
      ? [GUESS, 'It counts up by one.']
      : [0.9, 'Its heading names a count of samples.']
  if (role.kind === 'time') {
    if (heading.quantity !== 'time') return [GUESS, 'It rises evenly.']
    return heading.unit.family === 'time'
      ? [1, 'Its heading names time and unit.']
      : [0.85, 'Its heading names time; its steps fit this unit only.']
  }
  if (heading.quantity !== 'force') return [GUESS, 'It moves as a force does.']
  if (heading.unit.family !== 'force')
    return [GUESS, 'Its heading names a force without a unit; its size fits this one.']
  if (role.channel === 'total' && heading.foot === null)
    return [0.8, 'Its heading names a force and no foot.']
  return [1, 'Its heading names force and unit.']
}

/** Explains a settled map column by column; what a person must settle counts as a guess. */
export function explainMap(settled: Settled, columns: Columns): MapProposal {
  const map = completed(settled, columns)
  const count = Math.max(columns.headings.length, ...columns.numeric.map((index) => index + 1))
  const unit = map.forces[0]?.unit ?? 'N'
  const proposals = Array.from({ length: count }, (_, index): ColumnProposal => {
    const role = roleOf(index, map)
    const isNumeric = columns.numeric.includes(index)
    const why = settled.whys.get(index)
    const [confidence, sentence] = reasonFor(role, columns.headings[index], isNumeric)
    return {
      index,
      name: shown(columns.headings[index]?.name ?? ''),
      role,
      confidence: why?.confidence ?? confidence,
      reasons: why ? [sentence, why.sentence] : [sentence],
      alternatives: alternativesTo(role, isNumeric, unit),
    }
  })
  const used = proposals.filter(({ role }) => role.kind !== 'unused')
  const least = Math.min(1, ...used.map(({ confidence }) => confidence))
  const open = settled.problem !== null || map.forces.length === 0
  return { map, confidence: open ? Math.min(GUESS, least) : least, columns: proposals }
}
