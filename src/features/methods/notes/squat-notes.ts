import type { squatMetrics } from '../../../../shared/mechanics/catalogue/squat.ts'
import { begun, type MetricNote } from './note.ts'

const after = (ms: number): MetricNote => ({
  definition: `The force on the plates ${ms} ms after the onset of a push from a held squat.`,
  formula: `F_{${ms}} = F(t_{\\text{onset}} + ${ms}\\,\\text{ms})`,
  symbols: 'F the force, unfiltered; read from a parabola over some milliseconds around the instant',
  from: [],
  settings: [...begun, 'forceWindowS'],
  evidence: 'practice',
  limits:
    'It moves with the onset: where the force rises steeply, a millisecond is worth tens of newtons. A dip before the push makes it another figure.',
  read: `At ${ms} ms after the onset.`,
  events: ['onset'],
})

export const squatNotes: Record<keyof typeof squatMetrics, MetricNote> = {
  force50: after(50),
  force100: after(100),
  force200: after(200),
}
