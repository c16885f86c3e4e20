import { defaultSettings, type Settings } from '../settings.ts'
import {
  fitParabola,
  parabolaNoiseAt,
  parabolaSlopeAt,
  parabolaSlopeNoise,
  type Parabola,
} from './local-parabola.ts'
import type { Noise } from './noise.ts'

/** A greatest or least force of the noise-free curve, estimated between samples. */
export interface Peak {
  position: number
  value: number
  /** Standard uncertainties from noise and sampling: of the value, N, and of the position, samples. */
  valueU: number
  positionU: number
}

function extremeSample(force: Float64Array, from: number, to: number, sign: 1 | -1): number {
  let best = from
  let greatest = sign * force[from]
  for (let i = from + 1; i <= to; i++) {
    const value = sign * force[i]
    if (value > greatest) {
      greatest = value
      best = i
    }
  }
  return best
}

function vertex(fit: Parabola, sign: 1 | -1): number {
  const x = sign * fit.bend < 0 ? -fit.slope / (2 * fit.bend) : Math.sign(sign * fit.slope) * fit.half
  return fit.centre + Math.max(-fit.half, Math.min(fit.half, x))
}

function heightAt(fit: Parabola, position: number): number {
  const x = position - fit.centre
  return fit.level + x * (fit.slope + x * fit.bend)
}

/** Half-width at which the curve has fallen the settings' part of the noise from its peak. */
function halfWidth(
  force: Float64Array,
  centre: number,
  noise: Noise,
  dt: number,
  settings: Settings = defaultSettings,
): number {
  const widest = Math.max(1, Math.round(settings.peakWidestS / dt))
  let half = Math.min(widest, Math.max(2, Math.round(0.004 / dt)))
  for (let pass = 0; pass < 3; pass++) {
    const bend = Math.abs(fitParabola(force, centre, half).bend)
    const wanted = Math.sqrt((settings.peakFallSd * noise.sd) / Math.max(bend, 1e-9))
    half = Math.max(1, Math.min(widest, Math.round(wanted)))
  }
  return half
}

/**
 * Greatest (sign 1) or least (sign −1) force in [from, to] (samples). The largest sample of a noisy peak lies above
 * the true one; a parabola fitted over a window that fits the noise and the sharpness of the peak does not, and its
 * vertex is the estimate. A peak at an end of the stretch is read there.
 */
export function findPeak(
  force: Float64Array,
  from: number,
  to: number,
  sign: 1 | -1,
  noise: Noise,
  dt: number,
  settings: Settings = defaultSettings,
): Peak {
  const a = Math.max(0, Math.ceil(from))
  const b = Math.min(force.length - 1, Math.floor(to))
  let centre = extremeSample(force, a, Math.max(a, b), sign)
  const half = halfWidth(force, centre, noise, dt, settings)
  let fit = fitParabola(force, centre, half)
  for (let pass = 0; pass < 2; pass++) {
    centre = Math.max(a, Math.min(b, Math.round(vertex(fit, sign))))
    fit = fitParabola(force, centre, half)
  }
  const position = Math.max(from, Math.min(to, vertex(fit, sign)))
  const value = heightAt(fit, position)
  const wider = heightAt(fitParabola(force, centre, half + 1), position)
  const sampling = Math.abs(value - wider) / Math.sqrt(3)
  const fromNoise = parabolaNoiseAt(fit, position, noise)
  const positionU = parabolaSlopeNoise(fit, noise) / Math.max(1e-9, 2 * Math.abs(fit.bend))
  return {
    position,
    value,
    valueU: Math.hypot(fromNoise, sampling),
    positionU: Math.min(half + 1, Math.hypot(positionU, 0.05)),
  }
}

/**
 * The force where a person put a peak: of the curve there, and not the greatest. Besides the noise of its fit it is
 * as unsure as the curve is steep over the uncertainty `positionU` of the place, samples.
 */
export function readPeakAt(
  force: Float64Array,
  position: number,
  positionU: number,
  noise: Noise,
  dt: number,
  settings: Settings = defaultSettings,
): Peak {
  const centre = Math.round(position)
  const fit = fitParabola(force, centre, halfWidth(force, centre, noise, dt, settings))
  const slopeU = parabolaSlopeAt(fit, position) * positionU
  const fromNoise = parabolaNoiseAt(fit, position, noise)
  return { position, value: heightAt(fit, position), valueU: Math.hypot(fromNoise, slopeU), positionU }
}
