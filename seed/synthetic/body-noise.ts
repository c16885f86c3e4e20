import type { JumpDesign } from './jump-design.ts'
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

/** 0 to 1 over `width` from `start`, with its derivatives: 6u⁵ − 15u⁴ + 10u³. */
function fade(timeS: number, start: number, width: number): { x: number; v: number; a: number } {
  const u = (timeS - start) / width
  if (u <= 0) return { x: 0, v: 0, a: 0 }
  if (u >= 1) return { x: 1, v: 0, a: 0 }
  return {
    x: u ** 3 * (10 + u * (6 * u - 15)),
    v: (30 * u ** 2 * (1 - u) ** 2) / width,
    a: (60 * u * (1 - u) * (1 - 2 * u)) / width ** 2,
  }
}

/**
 * Sway and heartbeat of a standing body as a motion of its own: fading out in the dip, back in while the athlete
 * rises from the landing, so that the jump's own takeoff velocity stays exact.
 */
export function bodyNoise(
  options: BodyNoiseOptions,
  massKg: number,
  design: JumpDesign,
  random: Random,
): Motion {
  const waves = swayWaves(options, massKg, random)
  const sway = swayCourse(waves)
  const heart = heartCourse(options, massKg, random)
  const isStill = waves.length === 0 && options.heartbeatN === 0
  const { startS, minimumVelocityS, landingEndS, restS } = design
  const course: Course = (timeS) => {
    if (isStill || (timeS >= minimumVelocityS && timeS <= landingEndS)) return { x: 0, v: 0, a: 0 }
    const [p, q] = [sway(timeS), heart(timeS)]
    const [x, v, a] = [p.x + q.x, p.v + q.v, p.a + q.a]
    if (timeS <= startS || timeS >= restS) return { x, v, a }
    const out = fade(timeS, startS, minimumVelocityS - startS)
    const back = fade(timeS, landingEndS, restS - landingEndS)
    const e = { x: 1 - out.x + back.x, v: back.v - out.v, a: back.a - out.a }
    return { x: e.x * x, v: e.v * x + e.x * v, a: e.a * x + 2 * e.v * v + e.x * a }
  }
  return {
    displacement: (timeS) => course(timeS).x,
    velocity: (timeS) => course(timeS).v,
    acceleration: (timeS) => course(timeS).a,
  }
}
