import type { Pulse } from './pulses.ts'

/** One pulse placed in time: `amplitude` in m/s², `start` and `width` in seconds. */
export interface Component {
  pulse: Pulse
  start: number
  width: number
  amplitude: number
}

/** Acceleration, velocity and displacement of the body's centre as functions of time, exact at every instant. */
export interface Motion {
  acceleration: (timeS: number) => number
  velocity: (timeS: number) => number
  displacement: (timeS: number) => number
}

function velocityOf({ pulse, start, width, amplitude }: Component, timeS: number): number {
  const u = (timeS - start) / width
  if (u <= 0) return 0
  if (u <= 1) return amplitude * width * pulse.area(u)
  return amplitude * width * (pulse.area(1) + pulse.end * (u - 1))
}

function displacementOf({ pulse, start, width, amplitude }: Component, timeS: number): number {
  const u = (timeS - start) / width
  if (u <= 0) return 0
  if (u <= 1) return amplitude * width ** 2 * pulse.moment(u)
  const beyond = u - 1
  return amplitude * width ** 2 * (pulse.moment(1) + pulse.area(1) * beyond + (pulse.end * beyond ** 2) / 2)
}

function accelerationOf({ pulse, start, width, amplitude }: Component, timeS: number): number {
  const u = (timeS - start) / width
  if (u <= 0) return 0
  return amplitude * (u <= 1 ? pulse.value(u) : pulse.end)
}

/** The motion that begins at rest at displacement `originM` and follows the sum of the components' accelerations. */
export function motionOf(components: readonly Component[], originM = 0): Motion {
  const sum = (of: typeof velocityOf, origin: number) => (timeS: number) => {
    let total = origin
    for (const component of components) total += of(component, timeS)
    return total
  }
  return {
    acceleration: sum(accelerationOf, 0),
    velocity: sum(velocityOf, 0),
    displacement: sum(displacementOf, originM),
  }
}
