import type { Unloaded } from '../events/unloaded.ts'
import type { Settings } from '../settings.ts'
import type { Signal } from '../signal/condition.ts'
import type { AnalyseOptions, Note, Recording, Test, TrialAnalysis } from '../types.ts'

/** One trial's part of a recording as a protocol sees it: every position and time counts from its first sample. */
export interface TrialInput {
  recording: Recording
  /** As recorded, its zero not yet taken off. */
  signal: Signal
  unloaded: Unloaded
  test: Test
  options: AnalyseOptions
  settings: Settings
}

/** Why nothing can be said of a part of a recording as this test. */
export type NoTrial = Note

/** Analyses one trial. Its times count from the first sample of its input. */
export type AnalyseTrial = (input: TrialInput) => TrialAnalysis | NoTrial
