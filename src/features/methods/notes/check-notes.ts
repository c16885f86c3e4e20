import type { CheckKey } from '../../../../shared/mechanics/checks/check-definitions.ts'

/** What each Trial check measures, in plain words; limits, groups and remedies are the engine's. */
export const checkNotes: Record<CheckKey, string> = {
  'sample-rate': 'How many times a second the force was sampled.',
  'time-base': 'The greatest distance of a time stamp from the even spacing that the file’s rate asks for.',
  gaps: 'How many samples could not be read and were bridged by straight lines.',
  saturation:
    'The longest run of samples at the greatest force of a plate: a flat top means that its range ended.',
  polarity: 'How many plates read a press downwards as negative. The sign is turned over.',
  'zero-offset':
    'What the empty plates read in flight. It is taken off; a plate set to zero with the athlete on it is recognised and put right.',
  noise: 'The standard deviation of the force of the empty plates in flight.',
  'plate-alive': 'How many plates read the same all along.',
  'weighing-length': 'How long the athlete stood still before the jump. Under half a second it fails.',
  'weighing-steadiness':
    'The greater of the spread of the force during the weighing and the change between its halves, as a share of the weight.',
  'still-at-onset':
    'The speed that the body picked up between the middle of the weighing and the onset. It also fails where no quiet stance lies right before the movement.',
  'mass-agreement':
    'How far the mass that the plates weigh lies from the athlete’s recorded mass. Made only where a mass is recorded, or where too little is left once the external load is taken off.',
  'both-feet':
    'The share of the weight on the lighter foot in quiet stance, and whether a foot left its plate before takeoff. Made with two plates; a caution touches the sides only, a failure everything.',
  'foot-off-landing':
    'The longest time that a foot was off its plate after both had touched down. Made with two plates.',
  'side-agreement':
    'Whether the leg that the test names is the one that the athlete stood on. Made in tests of one leg with two plates.',
  'other-foot-off':
    'The greatest force of the other foot on its plate from the weighing to takeoff, as a share of the weight. Made in tests of one leg with two plates.',
  'other-foot-landing':
    'The greatest force of the other foot on its plate from touchdown until the fall is stopped, as a share of the weight. Made in tests of one leg with two plates.',
  'squat-dip':
    'How far the force falls under the weight between the onset and the greatest force of a squat jump, as a share of the weight. Beyond a tenth it is a countermovement.',
  'one-takeoff': 'How many flights the recording holds. The figures are those of the first.',
  'plausible-jump':
    'Whether the body went down before the push of a countermovement jump, and whether the jump height is that of a standing jump.',
  'height-agreement':
    'Height by flight time less height by impulse. It fails beyond 2.5 times the upper limit or 4 times the lower one. Where flight alone reads somewhat high, only the figures of the flight are touched.',
  'drop-height':
    'The height of a free fall that has the velocity of the first touch, less the height of the box. Made where the box is known.',
  'plausible-rebound':
    'How long the feet were on the ground between fall and jump, and whether the jump height is one that a body can reach.',
  'hop-count': 'How many contacts lie between two flights. Under five it fails, under ten it is a caution.',
  'hops-counted':
    'How many of the first ten contacts are short enough to count. Under five it fails; any that does not count is a caution.',
  'landing-on-plates': 'Whether a touchdown on the plates follows the takeoff.',
  'landing-length':
    'How long the recording goes on after touchdown. It fails where it ends before the fall is stopped.',
  'plausible-landing': 'The landing peak in multiples of system weight; under 1.1 it is no landing.',
  'closing-balance':
    'The momentum left over once the athlete stands still again, for each kilogram. Without a second of quiet stance it cannot be tested: a caution that touches the ledger only.',
}
