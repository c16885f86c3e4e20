import type { EngineInputs } from '../../../../shared/contracts/moved-events.ts'
import type { MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import type { Recording, Test } from '../../../../shared/mechanics/types.ts'
import type { WorkedExample } from '../../methods/worked-example.ts'
import type { Analysis } from './analysis-of.ts'

/** What the engine's worker can be asked, and what it answers. */
export interface EngineTasks {
  /** Keeps a trial's recording for all that is asked of it later. */
  hold: { ask: { recording: Recording; inputs: EngineInputs }; answer: null }
  /** Analyses the held trial with these events moved; null where the engine then finds no trial. */
  analyse: { ask: { movedEvents: MovedEvents }; answer: Analysis | null }
  /** Reads a file and analyses the trial of that test in it. */
  workOut: { ask: { bytes: Uint8Array; fileName: string; test: Test }; answer: WorkedExample }
}

export type EngineQuestion = {
  [Kind in keyof EngineTasks]: { id: number; kind: Kind; ask: EngineTasks[Kind]['ask'] }
}[keyof EngineTasks]

export type EngineReply = { id: number; answer: unknown } | { id: number; failed: string }
