import { measureLot } from './coverage-outcomes.ts'

/** A lot of trials in a thread of its own. */
export default measureLot
