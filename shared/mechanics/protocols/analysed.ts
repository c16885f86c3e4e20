import type { Protocol } from '../types.ts'

/** The tests that the engine analyses, and no other is offered. Apart from the engine, so that a screen loads none of it. */
export const analysedProtocols: readonly Protocol[] = ['cmj', 'sj', 'dj', 'slcmj', 'dropLanding', 'hops']
