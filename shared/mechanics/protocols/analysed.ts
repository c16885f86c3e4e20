import type { Protocol } from '../types.ts'

/** The tests that the engine analyses, and no other is offered. Apart from the engine, so that a screen loads none of it. */
export const analysedProtocols = ['cmj'] as const satisfies readonly Protocol[]

export type AnalysedProtocol = (typeof analysedProtocols)[number]

/** Whether a word read from outside names a test that the engine analyses. */
export function isAnalysed(protocol: string): protocol is AnalysedProtocol {
  return analysedProtocols.some((known) => known === protocol)
}
