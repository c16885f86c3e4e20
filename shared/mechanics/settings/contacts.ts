import { own, practice, type SettingDefinition } from './definition.ts'

const harper = 'Harper, Hobbs, Moore 2011 (10/5 repeated jumps)'

/** Which contacts count, and what stands in where a drop jump or landing has no quiet stance to weigh in. */
export const contactSettings = {
  longestCountedContactS: {
    value: 0.25,
    unit: 's',
    source: `${practice}, from memory: a longer contact is no rebound`,
    effect: 'Slower hops count',
  },
  contactsConsidered: {
    value: 10,
    unit: 'contacts',
    source: `${harper}: ten hops after the jump that starts them`,
    effect: 'Later hops count too',
  },
  bestContacts: {
    value: 5,
    unit: 'contacts',
    source: `${harper}: mean of the best five of ten`,
    effect: 'The mean takes in poorer hops',
  },
  fewestContacts: {
    value: 5,
    unit: 'contacts',
    source: `${own}: as many as the mean is taken of`,
    effect: 'Longer series are asked for',
  },
  recordedMassU: {
    value: 0.01,
    unit: 'of recorded mass, standard uncertainty',
    source: `${own}: what a body gains and loses within some days`,
    effect: 'Wider intervals where the recorded mass stands in for a weighing',
  },
  flightLowerU: {
    value: 0.03,
    unit: 'm, standard uncertainty',
    source: 'Baumgart et al. 2017 and Yamashita et al. 2020: the body lands 3 to 5 cm lower than it left',
    effect: 'Wider intervals where the time in the air stands in for integration from rest',
  },
} as const satisfies Record<string, SettingDefinition>
