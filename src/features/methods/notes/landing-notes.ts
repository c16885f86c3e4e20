import type { MetricKey } from '../../../../shared/mechanics/catalogue.ts'
import type { landingMetrics } from '../../../../shared/mechanics/catalogue/landing.ts'
import { crossed, integrated, peaked, perBodyWeight, type MetricNote } from './note.ts'

const noLimit =
  'It rises with jump height and with how the athlete was told to land. No validated injury limit exists.'
const rateLimits = `Loading rates depend strongly on definition, filter and sampling; figures of different methods cannot be compared. ${noLimit}`

const peak: MetricNote = {
  definition: 'The greatest force from touchdown until the fall is stopped, unfiltered.',
  formula: 'F_{\\text{peak}} = \\max F(t)',
  symbols: 'F the force, t between touchdown and zero velocity',
  from: [],
  settings: [...peaked, ...crossed, 'landingSearchS'],
  evidence: 'definition',
  limits: `A plate that rings after touchdown adds to it. ${noLimit}`,
  read: 'The highest point of the force in the landing.',
  events: ['touchdown', 'landingPeak'],
}
const meanRate: MetricNote = {
  definition: 'The peak force of the landing over the time that it took to get there.',
  formula: 'R = \\frac{F_{\\text{peak}}}{t_{\\text{peak}} - t_{\\text{touchdown}}}',
  symbols: 'F_peak landing peak force, t the instants of peak and touchdown',
  from: ['landingPeakForce', 'timeToLandingPeak'],
  settings: [...peaked, ...crossed],
  evidence: 'practice',
  limits: rateLimits,
  read: 'From touchdown to the landing peak.',
  events: ['touchdown', 'landingPeak'],
}
const rate2080: MetricNote = {
  definition:
    'The slope between the last upward crossings of 20 and 80 % of the landing peak before it, placed between samples.',
  formula: 'R = \\frac{(0.8 - 0.2)\\, F_{\\text{peak}}}{t_{80} - t_{20}}',
  symbols: 'F_peak landing peak force, t_20 and t_80 the crossings of 20 and 80 % of it',
  from: ['landingPeakForce'],
  settings: ['loadingRateLow', 'loadingRateHigh', 'loadingRateSamples', ...peaked],
  evidence: 'memory',
  limits: `The method comes from running. ${rateLimits}`,
  withoutU:
    'Left out where fewer than 8 samples lie between the crossings, or where the force turns near 20 or 80 % so that noise decides where the slope begins or ends.',
  read: 'On the rise of the force between touchdown and the landing peak.',
  events: ['touchdown', 'landingPeak'],
}
const greatestRate: MetricNote = {
  definition:
    'The greatest slope of a straight line fitted to the force over a short window before the peak.',
  formula: 'R = \\max \\frac{\\sum_j x_j\\, F_{i+j}}{\\sum_j x_j^2}',
  symbols: 'x the times of a window’s samples from its middle, F the force; the window slides to the peak',
  from: [],
  settings: ['loadingRateWindowS', ...crossed],
  evidence: 'practice',
  limits: `The window is part of the definition: a shorter one reads higher and noisier. ${rateLimits}`,
  read: 'The steepest stretch between touchdown and the landing peak.',
  events: ['touchdown', 'landingPeak'],
}
const perWeight = (key: MetricKey, note: MetricNote) => perBodyWeight(key, 'R', note)

export const landingNotes: Record<keyof typeof landingMetrics, MetricNote> = {
  landingPeakForce: peak,
  landingPeakForcePerBodyWeight: perBodyWeight('landingPeakForce', 'F', peak),
  landingFirstPeakForce: {
    ...peak,
    definition:
      'The force of the first maximum of the landing from which it falls away by the asked prominence; the landing peak where there is no other.',
    formula: 'F_1 = F(t_1)',
    symbols: 't_1 the first maximum after touchdown that stands out by the prominence',
    settings: ['firstPeakProminence', 'touchRiseN', ...peaked],
    evidence: 'published',
    unchecked: 'That landings have two peaks is published; the prominence is our own setting.',
    limits: `Where the peaks run into one another, noise can decide which is first. ${noLimit}`,
    read: 'The first bump of the force after touchdown.',
  },
  timeToLandingPeak: {
    ...meanRate,
    definition: 'The time from touchdown to the landing peak.',
    formula: '\\Delta t = t_{\\text{peak}} - t_{\\text{touchdown}}',
    symbols: 'the instants of landing peak and touchdown',
    from: [],
    limits: 'Where two peaks are nearly equal, it leaps from one to the other between trials.',
  },
  landingLoadingRateMean: meanRate,
  landingLoadingRateMeanPerBodyWeight: perWeight('landingLoadingRateMean', meanRate),
  landingLoadingRate2080: rate2080,
  landingLoadingRate2080PerBodyWeight: perWeight('landingLoadingRate2080', rate2080),
  landingLoadingRateMax: greatestRate,
  landingLoadingRateMaxPerBodyWeight: perWeight('landingLoadingRateMax', greatestRate),
  landingVelocity: {
    definition:
      'The velocity at touchdown by integration from rest, negative: from the onset through push and flight, or, after a drop and in hops, backwards from the stance after the landing.',
    formula:
      'v = \\frac{1}{m} \\int_{t_{\\text{rest}}}^{t_{\\text{touchdown}}} (F - W_{\\text{sys}})\\, \\mathrm{d}t',
    symbols: 'F the force, W_sys system weight, m system mass, t_rest an instant at rest',
    from: ['systemWeight'],
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    limits: 'The longer the integration, the further an error of the weight carries. It follows jump height.',
    read: 'At touchdown, by integration from rest.',
    events: ['onset', 'touchdown'],
  },
  landingTime: {
    definition: 'The time from touchdown until the fall is stopped.',
    formula: '\\Delta t = t_{\\text{zero velocity}} - t_{\\text{touchdown}}',
    symbols: 'the instants of zero velocity in the landing and of touchdown',
    from: [],
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    limits: 'A deep, soft landing takes longer. An error of the weight shifts the instant of zero velocity.',
    read: 'From touchdown to the landing’s lowest point.',
    events: ['touchdown', 'landingZeroVelocity'],
  },
  landingDepth: {
    definition: 'How far the centre of mass sinks from touchdown to the landing’s lowest point; negative.',
    formula: 's = \\int_{t_{\\text{touchdown}}}^{t_{\\text{zero velocity}}} v\\, \\mathrm{d}t',
    symbols: 'v the velocity of the centre of mass by integration from rest',
    from: [],
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    limits: 'Double integration over the whole jump: an error of the weight carries far.',
    read: 'Between touchdown and the landing’s lowest point.',
    events: ['touchdown', 'landingZeroVelocity'],
  },
  landingStiffness: {
    definition: 'The landing peak force over the depth that was reached when it occurred.',
    formula: 'k = \\frac{F_{\\text{peak}}}{s_{\\text{touchdown}} - s_{\\text{peak}}}',
    symbols: 'F_peak landing peak force, s displacement',
    from: ['landingPeakForce'],
    settings: [...integrated, ...crossed, ...peaked],
    evidence: 'memory',
    limits: `The legs are no spring, and an early peak meets little depth, which makes it large. ${noLimit}`,
    read: 'From touchdown to the landing peak.',
    events: ['touchdown', 'landingPeak'],
  },
  timeToStabilisation: {
    definition: 'The time from touchdown until the force stays near the weight for a second.',
    formula:
      'T = \\min \\{ t : |F - W_{\\text{sys}}| \\le 0.05\\, W_{\\text{sys}} \\text{ for 1 s} \\} - t_{\\text{touchdown}}',
    symbols: 'F the force over a short running mean, W_sys system weight',
    from: ['systemWeight'],
    settings: ['stabilisationFraction', 'stillWindowS', 'onsetSmoothingS'],
    evidence: 'memory',
    limits:
      'Varies much from trial to trial (published single-measure ICC under 0.5), and eighteen published ways to compute it disagree.',
    withoutU:
      'Always left out: where the force comes to stay near the weight is decided by the last swing, not by a smooth crossing.',
    read: 'From touchdown to where the athlete stands still.',
    events: ['touchdown', 'still'],
  },
}
