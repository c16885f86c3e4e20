import type { contactMetrics } from '../../../../shared/mechanics/catalogue/contacts.ts'
import type { SettingKey } from '../../../../shared/mechanics/settings.ts'
import { crossed, touched, weighed, type MetricNote } from './note.ts'

/** What a velocity by integration backwards from quiet stance rests on. */
const backwards: SettingKey[] = [...weighed, 'stillWindowS', 'recordedMassU', 'flightLowerU', 'gravityU']
/** What times of contact rest on. */
const timed: SettingKey[] = [...crossed, ...touched, 'recorderDelayU', 'smoothedDelayU', 'smoothedRoughness']
/** Which contacts of a series count. */
const counting: SettingKey[] = ['contactsConsidered', 'longestCountedContactS', 'fewestContacts']

const noRest =
  'Without a second of quiet stance after the landing it rests on the recorded mass and the time in the air, and its interval is wide.'

const rsi: MetricNote = {
  definition: 'The jump height from the time in the air over the time of the contact before it.',
  formula: 'R = \\frac{h}{t_c}, \\quad h = \\frac{g\\, t_f^2}{8}',
  symbols: 'h height from time in the air, t_c contact time, t_f flight time, g acceleration of free fall',
  from: ['jumpHeightFlight', 'contactTime'],
  settings: [...timed, 'gravityU'],
  evidence: 'memory',
  unchecked: 'Young 1995 and Flanagan, Comyns 2008 are cited from memory.',
  limits:
    'Bent legs at landing make it too large. It falls and rises with the height of the box and with what the athlete was told; drop jumps and hops are not interchangeable.',
  read: 'From the arrival to the takeoff, and from there to the touchdown.',
  events: ['arrival', 'takeoff', 'touchdown'],
}

const contactTime: MetricNote = {
  definition:
    'The time on the plates from the arrival to takeoff, both where the force crosses the event force.',
  formula: 't_c = t_{\\text{takeoff}} - t_{\\text{arrival}}',
  symbols: 'the instants of arrival and takeoff',
  from: [],
  settings: timed,
  evidence: 'definition',
  limits:
    'A plate that rings after the arrival, or a recorder that smooths the force, moves the arrival by a millisecond or so.',
  read: 'From the arrival to takeoff.',
  events: ['arrival', 'takeoff'],
}

export const contactNotes: Record<keyof typeof contactMetrics, MetricNote> = {
  contactTime,
  dropVelocity: {
    definition:
      'The velocity at the first touch of the plates, by integration backwards from quiet stance after the landing; negative.',
    formula:
      'v = -\\frac{1}{m} \\int_{t_{\\text{arrival}}}^{t_{\\text{still}}} (F - W_{\\text{sys}})\\, \\mathrm{d}t',
    symbols: 'F the force, W_sys system weight, m system mass',
    from: ['systemWeight'],
    settings: [...backwards, ...crossed],
    evidence: 'published',
    unchecked:
      'The one-plate method is published as valid against a second plate; the full text could not be read.',
    limits: `The longer until the athlete stands still, the further an error of the weight carries. ${noRest}`,
    read: 'At the arrival, by integration back from where the athlete stands still.',
    events: ['arrival', 'still'],
  },
  effectiveDropHeight: {
    definition: 'The height of a free fall that ends with the drop velocity.',
    formula: 'h = \\frac{v^2}{2\\, g}',
    symbols: 'v drop velocity, g acceleration of free fall',
    from: ['dropVelocity'],
    settings: [...backwards, ...crossed],
    evidence: 'published',
    limits: `Who steps down or jumps off falls from another height than the box has; this is the height that counts. ${noRest}`,
    read: 'At the arrival.',
    events: ['arrival', 'still'],
  },
  rsi,
  rsiFlightContact: {
    ...rsi,
    definition: 'The time in the air over the time of the contact before it: a ratio without a unit.',
    formula: 'R = \\frac{t_f}{t_c}',
    symbols: 't_f flight time, t_c contact time',
    from: ['flightTime', 'contactTime'],
    settings: timed,
    evidence: 'practice',
    unchecked: undefined,
    limits:
      'Literature calls this RSI too; its numbers are larger and cannot be compared with height over contact time. Bent legs at landing make it too large.',
  },
  hopCount: {
    definition: 'How many contacts lie between two flights. The jump that starts the series is none.',
    formula: 'n = \\#\\{\\text{contacts between two flights}\\}',
    symbols: 'n the number of contacts',
    from: [],
    settings: ['longestFlightS', 'eventPersistenceS', 'fewestContacts'],
    evidence: 'definition',
    limits: 'A stumble counts as a contact.',
    read: 'Over the whole series.',
    events: ['takeoff', 'touchdown'],
  },
  rsiBestFive: {
    ...rsi,
    definition:
      'The mean of the five greatest RSI among the first ten contacts, contacts that are too long left out.',
    formula: 'R = \\frac{1}{5} \\sum_{i=1}^{5} R_{(i)}, \\quad R_i = \\frac{g\\, t_{f,i}^2}{8\\, t_{c,i}}',
    symbols: 'R_(1) ≥ R_(2) ≥ … the RSI of the contacts that count, t_f flight time, t_c contact time',
    from: ['hopCount'],
    settings: [...counting, 'bestContacts', ...timed, 'gravityU'],
    evidence: 'memory',
    unchecked: 'That contacts over 250 ms are left out is cited from memory.',
    limits:
      'The best of several noisy figures read somewhat high. Not interchangeable with the RSI of a drop jump.',
    read: 'Over the contacts of the series, each with the flight after it.',
    events: ['takeoff', 'touchdown'],
  },
  contactTimeMean: {
    ...contactTime,
    definition: 'The mean time on the plates of the contacts that count among the first ten.',
    formula: 'T = \\frac{1}{n} \\sum_{i=1}^{n} t_{c,i}',
    symbols: 'T the mean, n the number of contacts that count, t_c their contact times',
    from: ['hopCount'],
    settings: [...counting, ...timed],
    read: 'Over the contacts of the series.',
    events: ['takeoff', 'touchdown'],
  },
}
