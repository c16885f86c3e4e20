import { analyse } from '../../../../shared/mechanics/analyse.ts'
import type { MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import { settingsWith } from '../../../../shared/mechanics/settings/choices.ts'
import { workOut } from '../../methods/worked-example.ts'
import { analysisOf, type Analysis } from './analysis-of.ts'
import type { EngineQuestion, EngineReply, EngineTasks } from './engine-tasks.ts'

/** The far side of the engine's worker: answers one question after another, keeping the trial that it was given. */
export function answerQuestions(): (question: EngineQuestion) => EngineReply {
  let held: EngineTasks['hold']['ask'] | null = null
  const answerTo = (question: EngineQuestion): unknown => {
    switch (question.kind) {
      case 'hold':
        held = question.ask
        return null
      case 'analyse':
        if (!held) throw new Error('No trial is held.')
        return analyseHeld(held, question.ask.movedEvents)
      case 'workOut':
        return workOut(question.ask.bytes, question.ask.fileName, question.ask.test)
    }
  }
  return (question) => {
    try {
      return { id: question.id, answer: answerTo(question) }
    } catch (error) {
      return { id: question.id, failed: error instanceof Error ? error.message : String(error) }
    }
  }
}

/** As the server's worker does it, with the inputs that the server named. */
function analyseHeld(
  { recording, inputs }: EngineTasks['hold']['ask'],
  movedEvents: MovedEvents,
): Analysis | null {
  const { test, recordedMassKg, gravity, calibrationU, changedSettings } = inputs
  const known = recordedMassKg === null ? {} : { recordedMassKg }
  const options = { test, ...known, gravity, calibrationU, movedEvents }
  const { trials, engineVersion, notes } = analyse(recording, options, settingsWith(changedSettings))
  const [trial] = trials
  if (!trial) return null
  const by = { id: 'provisional', engineVersion, gravity, movedEvents }
  return analysisOf({ ...trial, notes: [...notes, ...trial.notes] }, by)
}
