import { namedError } from '../../http/errors.ts'

export const recomputeRunning = () =>
  namedError(
    'recompute-running',
    409,
    'A recompute of this club is under way. Wait until it has ended, or cancel it.',
  )

export const nothingToRecompute = () =>
  namedError(
    'nothing-to-recompute',
    409,
    'Every analysis here was made with the engine, settings, plates and place that hold now.',
  )
