import { allJobs } from '../../../server/jobs/all-jobs.ts'
import { runJobs, type RunOptions } from '../../../server/jobs/run-jobs.ts'
import { createThreads, type ThreadLimits } from '../../../server/jobs/threads/threads.ts'
import type { Harness } from './harness.ts'

export interface WorkerOptions {
  run?: Partial<RunOptions>
  threads?: Partial<ThreadLimits>
}

/** The worker as it runs, inside the test: all jobs, in the worker's role. */
export async function startWorker({ workerDeps }: Harness, options: WorkerOptions = {}) {
  const threads = createThreads({ threads: 1, ...options.threads })
  const running = await runJobs({ ...workerDeps, threads }, allJobs, { idleMs: 25, ...options.run })
  return {
    counts: running.counts,
    async stop() {
      await running.stop()
      await threads.close()
    },
  }
}
