import { z } from 'zod'
import { Id } from '../../shared/contracts/fields.ts'

/** Schema of the database that pg-boss keeps its tables in. */
export const queueSchema = 'pgboss'

/**
 * A worker that dies in a job loses it after `expireInSeconds`; pg-boss looks for such jobs every
 * `maintenanceSeconds`, so another worker has it within a minute (40 + 5, and the wait before the retry).
 */
export const expireInSeconds = 40
export const maintenanceSeconds = 5

const ofUpload = z.strictObject({ version: z.literal(1), clubId: Id, uploadId: Id })
const ofRecompute = z.strictObject({ version: z.literal(1), clubId: Id, recomputeId: Id })
const ofBatch = ofRecompute.extend({ n: z.int().nonnegative() })
const ofTrial = z.strictObject({ version: z.literal(1), clubId: Id, trialId: Id })

/**
 * Every queue, once: read by the migration that makes them, by whoever sends and by whoever works. A payload
 * holds ids and the version of its own shape, and is parsed before the job starts, because a job may outlive
 * the program that sent it. `after` names the queue that a job falls into when its last try has failed.
 */
export const queues = {
  'give-up-reading': { payload: ofUpload, retryLimit: 5, retryDelaySeconds: 5 },
  'give-up-analysing': { payload: ofTrial, retryLimit: 5, retryDelaySeconds: 5 },
  'give-up-recomputing': { payload: ofBatch, retryLimit: 5, retryDelaySeconds: 5 },
  'read-upload': { payload: ofUpload, retryLimit: 3, retryDelaySeconds: 1, after: 'give-up-reading' },
  'analyse-trial': { payload: ofTrial, retryLimit: 3, retryDelaySeconds: 1, after: 'give-up-analysing' },
  'recompute-batch': {
    payload: ofBatch,
    retryLimit: 3,
    retryDelaySeconds: 1,
    after: 'give-up-recomputing',
    // Enough to keep two threads at work, and few enough that a file dropped meanwhile waits for one batch.
    atOnce: 3,
  },
  'add-up-moves': { payload: ofRecompute, retryLimit: 5, retryDelaySeconds: 1 },
  'sync-billing': {
    payload: z.strictObject({ version: z.literal(1), clubId: Id }),
    // With doubling pauses, about four hours of a payment service that is away; the night makes up for the rest.
    retryLimit: 12,
    retryDelaySeconds: 5,
    atOnce: 2,
  },
  'reconcile-billing': {
    payload: z.strictObject({ version: z.literal(1) }),
    retryLimit: 5,
    retryDelaySeconds: 60,
  },
  'send-mail': {
    payload: z.strictObject({ version: z.literal(1), mailId: Id }),
    // With doubling pauses, about four hours of a mail server that is away.
    retryLimit: 12,
    retryDelaySeconds: 5,
  },
} satisfies Record<string, QueueDefinition>

export interface QueueDefinition {
  payload: z.ZodObject
  retryLimit: number
  /** Pause before the first retry; each later one is twice as long. */
  retryDelaySeconds: number
  after?: string
  /** Jobs at work at once in one worker, where fewer than usual. */
  atOnce?: number
}

export type QueueName = keyof typeof queues
export type PayloadOf<N extends QueueName> = z.infer<(typeof queues)[N]['payload']>
export const queueNames = Object.keys(queues) as QueueName[]
