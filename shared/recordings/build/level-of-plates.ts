import { levelOf } from '../columns/content.ts'

/** A level nearer to zero than this share of the whole range says nothing of a sign. Ours, as in the engine. */
const CLEAR_SHARE = 0.1

/**
 * Turns a channel over in place where pressing down reads negative: its usual level is below zero and its largest
 * force points the same way, for a push and a landing reach further from standing than the empty plate does.
 */
export function putUpright(
  force: Float64Array,
  { least, greatest }: { least: number; greatest: number },
): boolean {
  const clear = CLEAR_SHARE * (greatest - least)
  if (!(least < -clear)) return false
  const usual = levelOf(force)
  if (!(usual < -clear) || usual - least <= greatest - usual) return false
  for (let i = 0; i < force.length; i++) force[i] = 0 - (force[i] as number)
  return true
}

/** The least share of a body's weight that one plate under it carries, N. Ours. */
const LEAST_WEIGHT_N = 100
/** Shortest flight that shows the empty plate, s. Ours. */
const SHORTEST_FLIGHT_S = 0.1
/** Samples looked at, spread over the record. */
const LOOKED_AT = 400

/**
 * Whether a plate was set to zero with the athlete on it: usually it reads about nothing, and for as long as a flight
 * it rests at minus a weight.
 */
export function wasTared(force: Float64Array, least: number, sampleRateHz: number): boolean {
  if (least > -LEAST_WEIGHT_N) return false
  const step = Math.max(1, Math.floor(force.length / LOOKED_AT))
  const some: number[] = []
  for (let at = 0; at < force.length; at += step) some.push(force[at] as number)
  const flightSamples = Math.max(3, Math.floor((SHORTEST_FLIGHT_S * sampleRateHz) / step))
  const sorted = some.toSorted((a, b) => a - b)
  const empty = sorted[flightSamples >> 1] ?? 0
  const usual = sorted[sorted.length >> 1] ?? 0
  if (empty > -LEAST_WEIGHT_N || Math.abs(usual) > -CLEAR_SHARE * empty) return false
  const atEmpty = some.filter((newtons) => Math.abs(newtons - empty) <= -CLEAR_SHARE * empty).length
  return atEmpty >= flightSamples
}
