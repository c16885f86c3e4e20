export { readFile, warmUp } from '../../../../server/jobs/threads/tasks.ts'

/** An engine that fails at everything. */
export function analyseSamples(): never {
  throw new Error('as asked')
}

export const analyseAll = analyseSamples
