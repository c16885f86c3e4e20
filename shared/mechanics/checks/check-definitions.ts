import type { MetricGroup } from '../types.ts'
import type { SettingKey } from '../settings.ts'
import { afterTakeoff, allButWeighing, allGroups } from './affected-groups.ts'

/** What is fixed of a Trial check, whatever a trial says. Screens and Method notes read it, and nothing else names one. */
export interface CheckDefinition {
  name: string
  /** Groups that a failure takes away; where the verdict decides which, the most that it can be. */
  affects: MetricGroup[]
  /** What to do about a caution or a failure. */
  remedy: string
  /** The limits and windows it goes by. */
  settings: SettingKey[]
}

/** Every check that the engine makes, in the order in which a trial lists them. */
const definitions = {
  'sample-rate': {
    name: 'Sample rate',
    affects: allGroups,
    remedy: 'Set the plates to 1000 samples a second.',
    settings: ['lowestSampleRateHz', 'poorestSampleRateHz'],
  },
  'time-base': {
    name: 'Even time base',
    affects: allGroups,
    remedy: 'Export the recording again, and check the connection of the plates.',
    settings: ['timeBaseLimit', 'timeBaseFail'],
  },
  gaps: {
    name: 'Missing samples',
    affects: allGroups,
    remedy: 'Export the recording again; what is missing cannot be measured.',
    settings: ['filledLimit'],
  },
  saturation: {
    name: 'Range of the plates',
    affects: ['push', 'landing', 'sides', 'impulse', 'jump', 'ledger'],
    remedy: 'Choose a larger measuring range of the plates.',
    settings: ['saturationSamples'],
  },
  polarity: {
    name: 'Sign of the force',
    affects: allGroups,
    remedy: 'Check the sign of the force columns in the export.',
    settings: [],
  },
  'zero-offset': {
    name: 'Zero of the plates',
    affects: allGroups,
    remedy: 'Set the plates to zero while nobody stands on them.',
    settings: ['zeroOffsetCautionN', 'zeroOffsetFailN'],
  },
  noise: {
    name: 'Noise of the plates',
    affects: allGroups,
    remedy: 'Look for a vibrating floor, a loose cable or a plate that touches its frame.',
    settings: ['noiseCautionN', 'noiseFailN'],
  },
  'plate-alive': {
    name: 'Signal of every plate',
    affects: allGroups,
    remedy: 'Check the connection of the plate and that each foot stands on its own.',
    settings: [],
  },
  'weighing-length': {
    name: 'Length of the weighing',
    affects: allGroups,
    remedy: 'Start recording, stand still for two seconds, then jump.',
    settings: ['weighingWindowS', 'shortestWeighingS', 'weighingFailS'],
  },
  'weighing-steadiness': {
    name: 'Steadiness of the weighing',
    affects: allGroups,
    remedy: 'Ask the athlete to stand still for two seconds before the jump.',
    settings: ['steadinessCaution', 'steadinessFail'],
  },
  'still-at-onset': {
    name: 'Still before the movement',
    affects: allButWeighing,
    remedy: 'Ask the athlete to stand still until the jump, without a little bounce before it.',
    settings: ['onsetVelocityCaution', 'onsetVelocityFail'],
  },
  'mass-agreement': {
    name: 'Agreement with the recorded mass',
    affects: allGroups,
    remedy: 'Check whose trial this is, the external load, and the recorded mass.',
    settings: ['massCaution', 'massFail', 'lightestBodyKg'],
  },
  'both-feet': {
    name: 'Both feet on the plates',
    affects: allGroups,
    remedy: 'Place each foot in the middle of its own plate.',
    settings: ['footShareCaution', 'footShareFail', 'footOffLandingS', 'eventForceN', 'unloadedSd'],
  },
  'foot-off-landing': {
    name: 'Feet on the plates in the landing',
    affects: ['landing', 'sides', 'ledger'],
    remedy: 'Land with each foot on its own plate; figures up to takeoff are not affected.',
    settings: ['footOffLandingS', 'eventForceN', 'unloadedSd'],
  },
  'side-agreement': {
    name: 'Side of the test',
    affects: allGroups,
    remedy: 'Correct the side of the test, or check which plate is the left one.',
    settings: [],
  },
  'other-foot-off': {
    name: 'Other foot off its plate',
    affects: allGroups,
    remedy: 'Hold the other foot clear of its plate from the weighing to takeoff.',
    settings: ['otherFootCaution', 'otherFootFail'],
  },
  'other-foot-landing': {
    name: 'Landing on one foot',
    affects: ['landing'],
    remedy: 'Land on the foot that jumped; figures up to takeoff are not affected.',
    settings: ['otherFootCaution', 'otherFootFail'],
  },
  'squat-dip': {
    name: 'No dip before the push',
    affects: ['jump', 'impulse', 'push', 'flight'],
    remedy: 'Hold the squat for two seconds, then push straight up without going down first.',
    settings: ['squatDipCaution', 'squatDipFail', 'onsetSmoothingS'],
  },
  'one-takeoff': {
    name: 'One takeoff',
    affects: allButWeighing,
    remedy: 'Record one jump a file, or set this trial aside.',
    settings: ['longestFlightS', 'eventPersistenceS'],
  },
  'plausible-jump': {
    name: 'Plausible jump',
    affects: allButWeighing,
    remedy: 'Look at the trace: perhaps this is another test, or the athlete stepped instead of jumping.',
    settings: ['lowestJumpM', 'highestJumpM'],
  },
  'height-agreement': {
    name: 'Height by impulse against height by flight',
    affects: ['jump', 'impulse', 'push', 'flight', 'landing', 'ledger'],
    remedy: 'Land with straight legs, stand still before the jump, and check the weighing.',
    settings: ['heightAgreementM', 'heightAgreementFailM', 'heightNegativeM', 'heightNegativeFailM'],
  },
  'drop-height': {
    name: 'Effective drop height against the box',
    affects: ['jump', 'impulse', 'push', 'contact'],
    remedy:
      'Step straight off the box without jumping or lowering yourself, and check the height of the box and the weighing.',
    settings: ['dropHeightCautionM', 'dropHeightFailM'],
  },
  'plausible-rebound': {
    name: 'Plausible drop jump',
    affects: allButWeighing,
    remedy:
      'Look at the trace: perhaps this is another test, or the athlete stood still between fall and jump.',
    settings: ['longestReboundS', 'lowestJumpM', 'highestJumpM'],
  },
  'hop-count': {
    name: 'Number of hops',
    affects: ['contact'],
    remedy: 'Hop ten times in a row after the jump that starts the series, and record all of them.',
    settings: ['fewestContacts', 'contactsConsidered', 'bestContacts'],
  },
  'hops-counted': {
    name: 'Hops that count',
    affects: ['contact'],
    remedy: 'Ask for quick hops: as little time on the ground as can be.',
    settings: ['longestCountedContactS', 'contactsConsidered', 'bestContacts'],
  },
  'landing-on-plates': {
    name: 'Landing on the plates',
    affects: afterTakeoff,
    remedy: 'Land on the plates; figures up to takeoff are not affected.',
    settings: ['longestFlightS'],
  },
  'landing-length': {
    name: 'Length of the landing',
    affects: ['landing', 'ledger'],
    remedy: 'Let the recording run for three seconds after the landing.',
    settings: ['landingLengthS'],
  },
  'plausible-landing': {
    name: 'Plausible landing',
    affects: ['landing', 'sides', 'ledger'],
    remedy: 'Check that the athlete landed with both feet on the plates.',
    settings: ['lowestLandingPeak'],
  },
  'closing-balance': {
    name: 'Closing balance of the momentum account',
    affects: ['jump', 'impulse', 'push', 'landing', 'ledger'],
    remedy: 'Check the weighing and that both feet stayed on the plates; repeat the trial.',
    settings: ['closingCaution', 'closingFail', 'stillWindowS'],
  },
} satisfies Record<string, CheckDefinition>

/** Stable name of a check in data, code and exports. */
export type CheckKey = keyof typeof definitions

export const checkDefinitions: Readonly<Record<CheckKey, CheckDefinition>> = definitions

export const checkKeys = Object.keys(definitions) as readonly CheckKey[]

/** Whether a word read from outside is a check's key. */
export function isCheckKey(key: string): key is CheckKey {
  return Object.hasOwn(definitions, key)
}
