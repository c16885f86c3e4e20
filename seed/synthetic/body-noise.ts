import type { Motion } from './motion.ts'
import type { BodyNoiseOptions } from './options.ts'
import type { Random } from './random.ts'

/** A displacement and its first two derivatives. */
type Course = (timeS: number) => { x: number; v: number; a: number }

interface Wave {
  amplitude: number
  omega: number
  phase: number
}

/** Band in which a quiet stance sways, Hz (from memory: most power lies below 1 Hz). */
const SWAY_BAND_HZ = { from: 0.2, to: 1.2 }
const SWAY_WAVES = 5
const FIDGET_HZ = 0.7
/** Width of one beat's push on the body, s. */
const BEAT_WIDTH_S = 0.35

function swayWaves(options: BodyNoiseOptions, massKg: number, random: Random): Wave[] {
  const waves = Array.from({ length: SWAY_WAVES }, (): Wave => {
    const omega = 2 * Math.PI * random.between(SWAY_BAND_HZ.from, SWAY_BAND_HZ.to)
    const velocity = options.swayVelocity * Math.sqrt(2 / SWAY_WAVES)
    return { amplitude: velocity / omega, omega, phase: random.between(0, 2 * Math.PI) }
  })
  const omega = 2 * Math.PI * FIDGET_HZ
  const fidget = {
    amplitude: options.fidgetN / (massKg * omega ** 2),
    omega,
    phase: random.between(0, 2 * Math.PI),
  }
  return [...waves, fidget].filter((wave) => wave.amplitude > 0)
}

function swayCourse(waves: Wave[]): Course {
  return (timeS) => {
    let [x, v, a] = [0, 0, 0]
    for (const { amplitude, omega, phase } of waves) {
      const angle = omega * timeS + phase
      const sine = amplitude * Math.sin(angle)
      x += sine
      v += amplitude * omega * Math.cos(angle)
      a -= omega ** 2 * sine
    }
    return { x, v, a }
  }
}

/** Each beat moves the centre by D·sin⁴(πu) and back: no impulse and no displacement is left over. */
function heartCourse(options: BodyNoiseOptions, massKg: number, random: Random): Course {
  const k = Math.PI / BEAT_WIDTH_S
  const size = options.heartbeatN / (massKg * 4 * k ** 2)
  const period = 1 / options.heartRateHz
  const shift = random.between(0, period)
  return (timeS) => {
    const since = (((timeS + shift) % period) + period) % period
    if (size === 0 || since >= BEAT_WIDTH_S) return { x: 0, v: 0, a: 0 }
    const [s, c] = [Math.sin(k * since), Math.cos(k * since)]
    return {
      x: size * s ** 4,
      v: 4 * size * k * s ** 3 * c,
      a: 4 * size * k ** 2 * s ** 2 * (3 * c ** 2 - s ** 2),
    }
  }
}

/** A change of how much of the body's unrest there is, all or none of it, over `widthS` from `atS` on. */
export interface Fade {
  atS: number
  widthS: number
  by: 1 | -1
}

/** When the body's unrest is there: fully or not at all at first, then as the fades say, in turn. */
export interface Unrest {
  atFirst: 0 | 1
  fades: readonly Fade[]
}

/** 0 to 1 over a width of 1, with its derivatives by time: 6u⁵ − 15u⁴ + 10u³. */
function fade(timeS: number, { atS, widthS }: Fade): { x: number; v: number; a: number } {
  const u = (timeS - atS) / widthS
  if (u <= 0) return { x: 0, v: 0, a: 0 }
  if (u >= 1) return { x: 1, v: 0, a: 0 }
  return {
    x: u ** 3 * (10 + u * (6 * u - 15)),
    v: (30 * u ** 2 * (1 - u) ** 2) / widthS,
    a: (60 * u * (1 - u) * (1 - 2 * u)) / widthS ** 2,
  }
}

function envelope({ atFirst, fades }: Unrest): Course {
  return (timeS) => {
    const e = { x: Number(atFirst), v: 0, a: 0 }
    for (const change of fades) {
      const part = fade(timeS, change)
      e.x += change.by * part.x
      e.v += change.by * part.v
      e.a += change.by * part.a
    }
    return e
  }
}

const still = { x: 0, v: 0, a: 0 }

/**
 * Sway and heartbeat of a standing body as a motion of its own, which is none while the body jumps, so that the
 * jump's own takeoff velocity stays exact.
 */
export function bodyNoise(options: BodyNoiseOptions, massKg: number, unrest: Unrest, random: Random): Motion {
  const waves = swayWaves(options, massKg, random)
  const sway = swayCourse(waves)
  const heart = heartCourse(options, massKg, random)
  const size = envelope(unrest)
  const isStill = waves.length === 0 && options.heartbeatN === 0
  const course: Course = (timeS) => {
    if (isStill) return still
    const e = size(timeS)
    if (e.x === 0 && e.v === 0 && e.a === 0) return still
    const [p, q] = [sway(timeS), heart(timeS)]
    const [x, v, a] = [p.x + q.x, p.v + q.v, p.a + q.a]
    return { x: e.x * x, v: e.v * x + e.x * v, a: e.a * x + 2 * e.v * v + e.x * a }
  }
  return {
    displacement: (timeS) => course(timeS).x,
    velocity: (timeS) => course(timeS).v,
    acceleration: (timeS) => course(timeS).a,
  }
}
