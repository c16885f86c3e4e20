import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, IsoDate } from './fields.ts'
import { Test } from './tests.ts'

/**
 * A mean over a session's included trials. `U` is the larger of what the plate says of the mean and what the
 * spread from trial to trial says of it, pooled over the session's athletes (null with neither).
 */
export const MeanFigure = z.strictObject({
  value: z.number(),
  U: z.number().nullable(),
  trials: z.number().int(),
})
export type MeanFigure = z.infer<typeof MeanFigure>

/** One athlete, one session, one test: means by metric key, SI units of the catalogue. */
export const ResultPoint = z.strictObject({
  sessionId: Id,
  date: IsoDate,
  sessionTitle: z.string(),
  test: Test,
  trialIds: z.array(Id),
  means: z.record(z.string(), MeanFigure),
})
export type ResultPoint = z.infer<typeof ResultPoint>

/** The athlete's own page: published results only, oldest first. */
export const getMyResults = endpoint({
  method: 'GET',
  path: '/api/me/results',
  access: ['athlete'],
  response: z.strictObject({
    athlete: z.strictObject({ id: Id, name: z.string() }).nullable(),
    results: z.array(ResultPoint),
  }),
})
