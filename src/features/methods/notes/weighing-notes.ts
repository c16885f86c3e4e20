import type { weighingMetrics } from '../../../../shared/mechanics/catalogue/weighing.ts'
import { integrated, weighed, type MetricNote } from './note.ts'

const stance = 'The steadiest second of quiet stance before the movement.'
const shared =
  'An error of 1 N in the weight shifts jump height by some 3.5 mm at 80 kg. Sway and heartbeat are real forces; the interval allows for them.'

export const weighingNotes: Record<keyof typeof weighingMetrics, MetricNote> = {
  bodyWeight: {
    definition: 'The force with which the athlete alone presses on the plates while standing still.',
    formula: 'W = W_{\\text{sys}} - m_{\\text{load}}\\, g',
    symbols: 'W_sys system weight, m_load the external load in kilograms, g acceleration of free fall',
    from: ['systemWeight'],
    settings: weighed,
    evidence: 'published',
    limits: `${shared} The external load is taken as stated.`,
    read: stance,
    events: ['onset'],
  },
  systemWeight: {
    definition: 'The mean force over the weighing, athlete and external load together.',
    formula: 'W_{\\text{sys}} = \\frac{1}{n} \\sum_{i=1}^{n} F_i',
    symbols: 'F the force of all plates with their zero taken off, n the samples of the weighing',
    from: [],
    settings: weighed,
    evidence: 'published',
    limits: shared,
    read: stance,
    events: ['onset'],
  },
  restToRestWeight: {
    definition:
      'The mean force from the onset until the athlete stands still again. Between two instants at rest the mean force is the weight, so this is a second opinion on the weighing.',
    formula:
      'W_{\\text{rest}} = \\frac{1}{T} \\int_{t_{\\text{onset}}}^{t_{\\text{still}}} F\\, \\mathrm{d}t',
    symbols: 'T the time from onset to still',
    from: ['systemWeight', 'closingBalance'],
    settings: [...integrated, 'stillWindowS'],
    evidence: 'definition',
    limits:
      'It says the same as the closing balance, which is T times its difference from system weight. It needs a second of quiet stance after landing, and both feet on the plates throughout.',
    read: 'From the onset to where the athlete stands still again.',
    events: ['onset', 'still'],
  },
  weighingSpread: {
    definition: 'The standard deviation of the force over the weighing.',
    formula: 's = \\sqrt{\\frac{1}{n-1} \\sum_{i=1}^{n} (F_i - W_{\\text{sys}})^2}',
    symbols: 'F the force at each sample, W_sys its mean, n the samples of the weighing',
    from: ['systemWeight'],
    settings: ['weighingWindowS', 'steadinessCaution', 'steadinessFail'],
    evidence: 'published',
    limits:
      'Plate noise, sway and heartbeat add up in it. Neighbouring samples are alike, so it must not be divided by the root of their number to get the error of the weight.',
    read: stance,
    events: ['onset'],
  },
  bodyMass: {
    definition: 'Body weight over the acceleration of free fall.',
    formula: 'm = \\frac{W}{g}',
    symbols: 'W body weight, g acceleration of free fall at the plate’s place',
    from: ['bodyWeight'],
    settings: [...weighed, 'gravityU'],
    evidence: 'definition',
    limits: 'Clothes and shoes are weighed too. Taking standard for local g errs by up to 0.3 %.',
    read: stance,
    events: ['onset'],
  },
}
