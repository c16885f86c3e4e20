import type { sidesMetrics } from '../../../../shared/mechanics/catalogue/sides.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'
import { crossed, integrated, weighed, type MetricNote } from './note.ts'

const caution =
  'A foot has no weight of its own, so only gross figures exist for one. Asymmetry changes with the figure, its direction and the task; thresholds of 10 or 15 % are conventions. Compare with the athlete’s own variation.'

const gross = (phase: string, events: [EventName, EventName]): MetricNote => ({
  definition: `The gross impulse of one foot over the ${phase} phase of both feet together.`,
  formula: 'J = \\int_{t_1}^{t_2} F_{\\text{foot}}\\, \\mathrm{d}t',
  symbols: 'F_foot the force of one plate, t_1 and t_2 the ends of the phase of the total force',
  from: [],
  settings: [...integrated, ...crossed],
  evidence: 'definition',
  limits: caution,
  read: `The area under each foot’s force over the ${phase} phase.`,
  events,
})

const lag = (event: 'takeoff' | 'touchdown'): MetricNote => ({
  definition: `The ${event} of the right foot less the ${event} of the left; positive where the right is later.`,
  formula: '\\Delta t = t_{\\text{right}} - t_{\\text{left}}',
  symbols: `the instants of ${event} of each foot by the rule of the total, on its own plate`,
  from: [],
  settings: [...crossed, 'unloadedSd'],
  evidence: 'definition',
  limits: 'A crooked stance or a foot that slides off makes it large. It takes two plates with one clock.',
  read: `Each foot’s own ${event}, near that of the total.`,
  events: [event],
})

export const sidesNotes: Record<keyof typeof sidesMetrics, MetricNote> = {
  stanceForce: {
    definition: 'The mean force of one foot over the weighing.',
    formula: 'F = \\frac{1}{n} \\sum_{i=1}^{n} F_{\\text{foot}, i}',
    symbols: 'F_foot the force of one plate, n the samples of the weighing',
    from: [],
    settings: weighed,
    evidence: 'definition',
    limits: `How a person stands shifts from moment to moment. ${caution}`,
    read: 'The steadiest second of quiet stance before the movement.',
    events: ['onset'],
  },
  unweightingGrossImpulse: gross('unweighting', ['onset', 'minimumVelocity']),
  brakingGrossImpulse: gross('braking', ['minimumVelocity', 'zeroVelocity']),
  propulsionGrossImpulse: gross('propulsion', ['zeroVelocity', 'takeoff']),
  landingGrossImpulse: gross('landing', ['touchdown', 'landingZeroVelocity']),
  meanLandingForce: {
    definition: 'The gross impulse of one foot in the landing over the time of the landing.',
    formula: 'F_{\\text{mean}} = \\frac{J}{\\Delta t}',
    symbols: 'J the gross impulse of one foot in the landing, Δt landing time',
    from: ['landingTime'],
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    limits: caution,
    read: 'The mean height of each foot’s force from touchdown to the landing’s lowest point.',
    events: ['touchdown', 'landingZeroVelocity'],
  },
  feetTakeoffLag: lag('takeoff'),
  feetTouchdownLag: lag('touchdown'),
}
