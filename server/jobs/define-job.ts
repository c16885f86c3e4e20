import type { Deps } from '../deps.ts'
import { type PayloadOf, type QueueName, queues } from './queues.ts'
import type { Threads } from './threads/threads.ts'

/** What a job is given: everything a service has, and the threads that read and compute. */
export type JobDeps = Deps & { threads: Threads }

/** What works one queue. `handle` may run twice for one job, and must leave what running once leaves. */
export interface Job {
  queue: QueueName
  handle(deps: JobDeps, payload: unknown): Promise<void>
}

/** Ties a queue to its work; the payload is parsed before `handle` sees it. */
export function defineJob<N extends QueueName>(
  queue: N,
  handle: (deps: JobDeps, payload: PayloadOf<N>) => Promise<void>,
): Job {
  return {
    queue,
    handle: (deps, payload) => handle(deps, queues[queue].payload.parse(payload) as PayloadOf<N>),
  }
}
