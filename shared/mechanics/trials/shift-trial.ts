import type { AnalyseOptions, EventName, TrialAnalysis } from '../types.ts'

type MovedEvents = AnalyseOptions['movedEvents']

/** A trial's times on the clock of the recording that it was cut from at `from` (a sample). */
export function shiftTrial(trial: TrialAnalysis, from: number, dt: number): TrialAnalysis {
  const by = from * dt
  const events = Object.entries(trial.events).map(([name, { timeS, sample }]) => [
    name,
    { timeS: timeS + by, sample: sample + from },
  ])
  return {
    ...trial,
    startS: trial.startS + by,
    endS: trial.endS + by,
    events: Object.fromEntries(events),
    ...(trial.contacts && {
      contacts: trial.contacts.map((contact) => ({
        ...contact,
        touchdownS: contact.touchdownS + by,
        takeoffS: contact.takeoffS + by,
      })),
    }),
    ledger: trial.ledger && {
      ...trial.ledger,
      entries: trial.ledger.entries.map((entry) => ({
        ...entry,
        startS: entry.startS + by,
        endS: entry.endS + by,
      })),
    },
  }
}

/** Events that a person moved, on the clock of a part from `fromS` to `toS`; those outside it are of another trial. */
export function movedWithin(moved: MovedEvents, fromS: number, toS: number): MovedEvents {
  if (!moved) return moved
  const inside = (Object.entries(moved) as [EventName, number][]).filter(
    ([, timeS]) => timeS >= fromS && timeS <= toS,
  )
  return Object.fromEntries(inside.map(([name, timeS]) => [name, timeS - fromS]))
}
