import type { Component } from './motion.ts'
import { earlyPeak, halfSine, latePeak, raisedCosine } from './pulses.ts'
import type { Pulse } from './pulses.ts'

/** How the push upward goes: one even hump, an early hump, a late hump, or two humps. */
export type PushShape = 'even' | 'early' | 'late' | 'twoHumps'
/** How the landing goes: one peak, or a short first peak of the forefoot and a longer second one. */
export type LandingShape = 'onePeak' | 'twoPeaks'
/** How a rebound's force goes: like a spring, without edges, with a short impact before it, or early. */
export type ContactShape = 'spring' | 'round' | 'impact' | 'early'

/** A pulse's place within its phase, as fractions of the phase's width. */
interface Part {
  pulse: Pulse
  from: number
  width: number
  weight: number
}

export type Parts = readonly Part[]

const whole = (pulse: Pulse): Parts => [{ pulse, from: 0, width: 1, weight: 1 }]

export const pushParts: Record<PushShape, Parts> = {
  even: whole(raisedCosine),
  early: whole(earlyPeak),
  late: whole(latePeak),
  twoHumps: [
    { pulse: raisedCosine, from: 0, width: 0.7, weight: 1 },
    { pulse: latePeak, from: 0.35, width: 0.65, weight: 0.8 },
  ],
}

export const landingParts: Record<LandingShape, Parts> = {
  onePeak: whole(raisedCosine),
  twoPeaks: [
    { pulse: raisedCosine, from: 0.02, width: 0.24, weight: 0.75 },
    { pulse: earlyPeak, from: 0.08, width: 0.92, weight: 1 },
  ],
}

/** Their middles lie near the middle of the contact: the body leaves about as high as it came. */
export const contactParts: Record<ContactShape, Parts> = {
  spring: whole(halfSine),
  round: whole(raisedCosine),
  impact: [
    { pulse: halfSine, from: 0, width: 0.28, weight: 0.35 },
    { pulse: halfSine, from: 0, width: 1, weight: 1 },
    { pulse: raisedCosine, from: 0.45, width: 0.55, weight: 0.25 },
  ],
  early: [
    { pulse: halfSine, from: 0, width: 1, weight: 1 },
    { pulse: raisedCosine, from: 0.05, width: 0.55, weight: 0.4 },
  ],
}

/** The parts as components of a phase, each part's weight times `amplitude` high. */
export function place(parts: Parts, start: number, width: number, amplitude: number): Component[] {
  return parts.map((part) => ({
    pulse: part.pulse,
    start: start + part.from * width,
    width: part.width * width,
    amplitude: amplitude * part.weight,
  }))
}

/** Change of velocity that parts of amplitude 1 give over a phase of width 1. */
export const areaOf = (parts: Parts): number =>
  parts.reduce((sum, part) => sum + part.weight * part.width * part.pulse.area(1), 0)
