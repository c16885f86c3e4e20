import { define, display, tests } from './define.ts'

const owen = 'Owen, Watkins, Kilduff, Bevan, Bennett 2014, J Strength Cond Res 28(6):1552–1558'

/** What the quiet stance says. */
export const weighingMetrics = define(tests.weighed, {
  bodyWeight: {
    name: 'Body weight',
    unit: 'N',
    display: display.newtonFine,
    group: 'weighing',
    phase: null,
    source: `${owen}: mean force over 1 s of quiet stance; less the external load`,
    athleteSentence: 'The force with which you press on the plates while standing still.',
  },
  systemWeight: {
    name: 'System weight',
    unit: 'N',
    display: display.newtonFine,
    group: 'weighing',
    phase: null,
    source: `${owen}: mean force over 1 s of quiet stance, external load included`,
    athleteSentence: 'Your body weight together with any weight that you carry.',
  },
  restToRestWeight: {
    name: 'Weight, rest to rest',
    protocols: tests.restToRest,
    unit: 'N',
    display: display.newtonFine,
    group: 'ledger',
    phase: null,
    source: 'Definition: between two instants at rest the mean force equals the weight (momentum theorem)',
    athleteSentence: 'Your weight worked out from the whole jump, as a second opinion on the weighing.',
  },
  weighingSpread: {
    name: 'Spread of the weighing',
    unit: 'N',
    display: display.newtonFine,
    group: 'weighing',
    phase: null,
    source: `${owen}: standard deviation of the force over the weighing window`,
    athleteSentence: 'How much the force wavered while you stood still: the smaller, the surer the weighing.',
  },
  bodyMass: {
    name: 'Body mass',
    unit: 'kg',
    display: display.kilogram,
    group: 'weighing',
    phase: null,
    source: 'Definition: body weight over the local acceleration of free fall',
    athleteSentence: 'Your mass as the plates weighed it.',
    sameFactAs: 'bodyWeight',
  },
})
