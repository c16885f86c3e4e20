import type { impulseMetrics } from '../../../../shared/mechanics/catalogue/impulse.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'
import { crossed, integrated, type MetricNote } from './note.ts'

const letters = 'F the force, W_sys system weight; the limits are the events of the phase'

function overPhase(
  definition: string,
  [from, to]: [EventName, EventName],
  [a, b]: [string, string],
  rest: Pick<MetricNote, 'from' | 'limits'>,
): MetricNote {
  return {
    definition,
    formula: `J = \\int_{t_{\\text{${a}}}}^{t_{\\text{${b}}}} (F - W_{\\text{sys}})\\, \\mathrm{d}t`,
    symbols: letters,
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    read: `The area between force and weight from ${a} to ${b}.`,
    events: [from, to],
    ...rest,
  }
}

const window = (ms: string, setting: 'landingImpulseShortS' | 'landingImpulseLongS'): MetricNote => ({
  definition: `The gross impulse of the ground on the body in the first ${ms} of the landing, weight included.`,
  formula: 'J = \\int_{t_{\\text{touchdown}}}^{t_{\\text{touchdown}} + \\tau} F\\, \\mathrm{d}t',
  symbols: `F the force, τ the window of ${ms}`,
  from: [],
  settings: [setting, ...crossed],
  evidence: 'practice',
  limits:
    'A fixed window cuts slow and quick landings at different places. Gross, not net: it cannot be compared with the landing impulse. No validated injury limit exists.',
  read: `The area under the force in the first ${ms} after touchdown.`,
  events: ['touchdown'],
})

export const impulseNotes: Record<keyof typeof impulseMetrics, MetricNote> = {
  unweightingImpulse: overPhase(
    'The net impulse while the force is under the weight and the body picks up speed downwards; negative.',
    ['onset', 'minimumVelocity'],
    ['onset', 'fastest down'],
    {
      from: ['systemWeight', 'peakDownwardVelocity'],
      limits: 'It is system mass times the greatest downward velocity. A hesitant start belongs to it.',
    },
  ),
  brakingImpulse: overPhase(
    'The net impulse that stops the way down: from the greatest downward velocity, or the first touch of a drop jump, to zero velocity.',
    ['minimumVelocity', 'zeroVelocity'],
    ['fastest down', 'lowest'],
    {
      from: ['unweightingImpulse'],
      limits:
        'In a countermovement it is the unweighting impulse with its sign turned, in a drop jump system mass times drop velocity: it says nothing new.',
    },
  ),
  propulsionImpulse: overPhase(
    'The net impulse from the lowest point to takeoff.',
    ['zeroVelocity', 'takeoff'],
    ['lowest', 'takeoff'],
    {
      from: ['netImpulse'],
      limits: 'Momentum is zero at the lowest point, so it equals the net impulse of the whole push.',
    },
  ),
  netImpulse: overPhase(
    'The net impulse of the whole push, from the onset, or the first touch of a drop jump, to takeoff.',
    ['onset', 'takeoff'],
    ['onset', 'takeoff'],
    {
      from: ['systemWeight', 'takeoffVelocity'],
      limits:
        'From stance it is takeoff momentum under another name; in a drop jump it is system mass times takeoff velocity less drop velocity. A gain error of the plates goes right into it.',
    },
  ),
  landingImpulse: overPhase(
    'The net impulse that stops the fall, from touchdown to zero velocity.',
    ['touchdown', 'landingZeroVelocity'],
    ['touchdown', 'zero velocity'],
    {
      from: ['systemWeight', 'landingVelocity'],
      limits:
        'System mass times landing velocity with its sign turned: it grows with jump height and says nothing of how softly the athlete landed.',
    },
  ),
  landingImpulse50: window('50 ms', 'landingImpulseShortS'),
  landingImpulse100: window('100 ms', 'landingImpulseLongS'),
  closingBalance: {
    definition:
      'What is left of the momentum account once the athlete stands still again. Physics makes it zero; the rest is measurement error.',
    formula: 'J = \\int_{t_{\\text{onset}}}^{t_{\\text{still}}} (F - W_{\\text{sys}})\\, \\mathrm{d}t',
    symbols: letters,
    from: ['restToRestWeight', 'systemWeight'],
    settings: [...integrated, 'stillWindowS', 'closingCaution', 'closingFail'],
    evidence: 'definition',
    limits:
      'It needs a second of quiet stance after landing. Errors can cancel: a small balance is a good sign, not a proof.',
    read: 'From the onset to where the athlete stands still again.',
    events: ['onset', 'still'],
  },
}
