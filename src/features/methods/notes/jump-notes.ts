import type { jumpMetrics } from '../../../../shared/mechanics/catalogue/jump.ts'
import { begun, crossed, integrated, type MetricNote } from './note.ts'

const onsetChoice =
  'The rule for the onset moves it: compare only figures of one rule. A noisy or restless stance makes it less sure.'

export const jumpNotes: Record<keyof typeof jumpMetrics, MetricNote> = {
  jumpHeightImpulse: {
    definition:
      'The rise of the body’s centre of mass after takeoff, from takeoff velocity. This is the jump height of every screen.',
    formula: 'h = \\frac{v^2}{2g}',
    symbols: 'v takeoff velocity, g acceleration of free fall',
    from: ['takeoffVelocity'],
    settings: [...integrated, ...crossed],
    evidence: 'published',
    limits:
      'The body is already some centimetres above standing at takeoff; that rise is not in it. Published definitions of jump height differ by up to 15 cm on the same jump, so compare like with like.',
    read: 'From the velocity at takeoff.',
    events: ['onset', 'takeoff'],
  },
  jumpHeightFlight: {
    definition:
      'Jump height worked out from the time in the air, as if the body landed in the posture of takeoff.',
    formula: 'h_t = \\frac{g\\, t^2}{8}',
    symbols: 't flight time, g acceleration of free fall',
    from: ['flightTime'],
    settings: [...crossed, 'gravityU'],
    evidence: 'published',
    limits:
      'Bent hips, knees or ankles at touchdown lengthen the flight: some 2 cm too high is usual, and an athlete can cheat it. It also reads high because flight is timed at the event force.',
    read: 'Between takeoff and touchdown.',
    events: ['takeoff', 'touchdown'],
  },
  jumpHeightTotal: {
    definition: 'The highest point of the centre of mass above where it was in quiet stance.',
    formula: 'h_{\\text{total}} = \\frac{v^2}{2g} + s_{\\text{takeoff}}',
    symbols: 'v takeoff velocity, s the displacement from quiet stance, by double integration',
    from: ['jumpHeightImpulse'],
    settings: [...integrated, ...crossed],
    evidence: 'published',
    limits:
      'Double integration carries an error of the weight further than the velocity does. Not to be compared with the rise above takeoff.',
    read: 'Displacement and velocity at takeoff.',
    events: ['onset', 'takeoff'],
  },
  takeoffVelocity: {
    definition:
      'The upward velocity of the centre of mass at takeoff, by impulse and momentum from rest: from the onset, or, in a drop jump, backwards from the stance after the landing.',
    formula:
      'v = \\frac{1}{m} \\int_{t_{\\text{onset}}}^{t_{\\text{takeoff}}} (F - W_{\\text{sys}})\\, \\mathrm{d}t',
    symbols: 'F the force, W_sys system weight, m system mass',
    from: ['netImpulse', 'systemWeight'],
    settings: [...integrated, ...crossed],
    evidence: 'published',
    limits:
      'Takeoff is where the force falls through the event force, not zero: the velocity stands some 10 mm/s above that at zero force for each millisecond between them. The weight is the largest source of error.',
    read: 'At takeoff, by integration since the onset.',
    events: ['onset', 'takeoff'],
  },
  takeoffMomentum: {
    definition: 'System mass times takeoff velocity.',
    formula: 'p = m\\, v',
    symbols: 'm system mass, v takeoff velocity',
    from: ['systemWeight', 'takeoffVelocity'],
    settings: [...integrated, ...crossed],
    evidence: 'published',
    limits: 'It is the net impulse under another name. A heavier athlete has more at the same height.',
    read: 'At takeoff.',
    events: ['onset', 'takeoff'],
  },
  flightTime: {
    definition: 'The time from takeoff to touchdown.',
    formula: 't = t_{\\text{touchdown}} - t_{\\text{takeoff}}',
    symbols: 'both instants where the force crosses the event force',
    from: [],
    settings: [...crossed, 'unloadedSd', 'longestFlightS'],
    evidence: 'definition',
    limits:
      'Timed at the event force, it is some milliseconds longer than the time at zero force. Bent legs at landing lengthen it.',
    read: 'Between takeoff and touchdown.',
    events: ['takeoff', 'touchdown'],
  },
  timeToTakeoff: {
    definition: 'The time from the onset of movement to takeoff.',
    formula: 'T = t_{\\text{takeoff}} - t_{\\text{onset}}',
    symbols: 'onset: 30 ms before the force leaves the weight by the onset fraction',
    from: [],
    settings: [...begun, ...crossed],
    evidence: 'memory',
    limits: onsetChoice,
    read: 'Between onset and takeoff.',
    events: ['onset', 'takeoff'],
  },
  rsiModified: {
    definition: 'The reactive strength index, modified: jump height over time to takeoff.',
    formula: '\\text{RSImod} = \\frac{h}{T}',
    symbols: 'h jump height, T time to takeoff',
    from: ['jumpHeightImpulse', 'timeToTakeoff'],
    settings: [...integrated, ...crossed],
    evidence: 'memory',
    limits: `Not interchangeable with the index of drop jumps. ${onsetChoice}`,
    read: 'Between onset and takeoff, and the velocity at takeoff.',
    events: ['onset', 'takeoff'],
  },
  flightPerTakeoffTime: {
    definition: 'Flight time for each second of time to takeoff.',
    formula: 'r = \\frac{t}{T}',
    symbols: 't flight time, T time to takeoff',
    from: ['flightTime', 'timeToTakeoff'],
    settings: [...begun, ...crossed],
    evidence: 'published',
    limits: `It says much the same as RSImod, and bent legs at landing raise it. ${onsetChoice}`,
    read: 'From onset to takeoff, and from takeoff to touchdown.',
    events: ['onset', 'takeoff', 'touchdown'],
  },
}
