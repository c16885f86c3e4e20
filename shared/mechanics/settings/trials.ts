import { own, type SettingDefinition } from './definition.ts'

/** How the trials of a recording are told apart, and what test a trace looks like where none is named. */
export const trialSettings = {
  quietBetweenS: {
    value: 0.5,
    unit: 's',
    source: `${own}: the shortest stance that can be weighed in`,
    effect: 'Jumps close upon one another are taken for one trial',
  },
  strikeShare: {
    value: 1.5,
    unit: 'of the usual load',
    source: `${own}: a step onto the plates stays below`,
    effect: 'Only harder arrivals are taken for a fall, and stronger pushes for a jump off the plates',
  },
  strikeS: {
    value: 0.3,
    unit: 's',
    source: own,
    effect: 'The strike is looked for longer after the arrival',
  },
  longestReboundS: {
    value: 0.7,
    unit: 's',
    source: `${own}: far beyond any rebound`,
    effect: 'Slower contacts are taken for a drop jump or hops',
  },
  fewestHopFlights: {
    value: 4,
    unit: 'flights',
    source: `${own}: fewer may be jumps without a pause`,
    effect: 'Longer series are asked for before they are taken for hops',
  },
  dipSearchS: { value: 0.5, unit: 's', source: own, effect: 'An earlier dip is taken for a countermovement' },
  proposedDip: {
    value: 0.15,
    unit: 'of the usual load',
    source: `${own}: between the dip that a squat jump may have and that of a countermovement`,
    effect: 'More jumps are taken for squat jumps',
  },
} as const satisfies Record<string, SettingDefinition>
