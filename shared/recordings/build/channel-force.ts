import { toMillinewtonPrecision } from '../force-precision.ts'
import type { TimeBase } from '../time-base.ts'

/** One column of a channel, and the newtons in one of its units. */
export interface ChannelPart {
  values: Float64Array
  factor: number
}

/** One channel on the even base in newtons: rounded to 0.001 N where it has no blanks, else NaN in them. */
export interface ChannelForce {
  force: Float64Array
  hasBlanks: boolean
  least: number
  greatest: number
}

function placed(parts: readonly ChannelPart[], { length, sampleOfRow }: TimeBase): Float64Array {
  const force = new Float64Array(length)
  if (sampleOfRow) force.fill(NaN)
  parts.forEach(({ values, factor }, part) => {
    const rows = values.length
    for (let row = 0; row < rows; row++) {
      const sample = sampleOfRow ? (sampleOfRow[row] as number) : row
      const newtons = (values[row] as number) * factor
      force[sample] = part === 0 ? newtons : (force[sample] as number) + newtons
    }
  })
  return force
}

/** A column of its own on rows without gaps: one pass, and the rounding with it. null where a cell is blank. */
function roundedAtOnce({ values, factor }: ChannelPart): ChannelForce | null {
  const { length } = values
  const force = new Float64Array(length)
  let [least, greatest] = [Infinity, -Infinity]
  for (let i = 0; i < length; i++) {
    const newtons = (values[i] as number) * factor
    if (newtons !== newtons) return null
    if (newtons < least) least = newtons
    if (newtons > greatest) greatest = newtons
    force[i] = toMillinewtonPrecision(newtons)
  }
  return { force, hasBlanks: false, least, greatest }
}

/** Adds up the columns of a channel and lays them on the even base. */
export function channelForce(parts: readonly ChannelPart[], base: TimeBase): ChannelForce {
  const [only] = parts
  const atOnce = only && parts.length === 1 && !base.sampleOfRow ? roundedAtOnce(only) : null
  if (atOnce) return atOnce
  const force = placed(parts, base)
  let [least, greatest, blanks] = [Infinity, -Infinity, 0]
  for (let i = 0; i < force.length; i++) {
    const newtons = force[i] as number
    if (newtons < least) least = newtons
    if (newtons > greatest) greatest = newtons
    if (newtons !== newtons) blanks++
  }
  if (blanks === 0)
    for (let i = 0; i < force.length; i++) force[i] = toMillinewtonPrecision(force[i] as number)
  return { force, hasBlanks: blanks > 0, least, greatest }
}
