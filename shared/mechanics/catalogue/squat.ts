import { define, display, tests } from './define.ts'

const source = (ms: number) => `Common practice: force on the plates ${ms} ms after the onset, unfiltered`

/** How the force of a push from a held squat begins. */
export const squatMetrics = define(tests.squat, {
  force50: {
    name: 'Force after 50 ms',
    unit: 'N',
    display: display.newton,
    better: 'higher',
    group: 'push',
    phase: 'propulsion',
    source: source(50),
    athleteSentence: 'The force under your feet 50 ms after you began to push.',
  },
  force100: {
    name: 'Force after 100 ms',
    unit: 'N',
    display: display.newton,
    better: 'higher',
    group: 'push',
    phase: 'propulsion',
    source: source(100),
    athleteSentence: 'The force under your feet 100 ms after you began to push.',
  },
  force200: {
    name: 'Force after 200 ms',
    unit: 'N',
    display: display.newton,
    better: 'higher',
    group: 'push',
    phase: 'propulsion',
    source: source(200),
    athleteSentence: 'The force under your feet 200 ms after you began to push.',
  },
})
