import { availableParallelism } from 'node:os'
import { fileURLToPath } from 'node:url'
import { Piscina } from 'piscina'
import { createSlots } from './slots.ts'
import type * as tasks from './tasks.ts'

/** Reading and computing, away from the thread that talks to the database. */
export interface Threads {
  /** The file is fetched when its turn has come: no more files are in memory than there are threads. */
  readFile(fetch: () => Promise<tasks.ReadFile>): ReturnType<typeof tasks.readFile>
  analyseSamples: typeof tasks.analyseSamples
  analyseAll(all: readonly tasks.AnalyseSamples[]): Promise<ReturnType<typeof tasks.analyseAll>>
  /** Starts every thread and compiles its way through a recording. */
  warm(): Promise<void>
  close(): Promise<void>
}

/** A thread was ended because of what it worked on; running it again would end the same way. */
export class ThreadEnded extends Error {
  readonly reason: 'time' | 'memory'

  constructor(reason: 'time' | 'memory') {
    super(reason === 'time' ? 'The work took too long and was stopped.' : 'The work needed too much memory.')
    this.reason = reason
  }
}

export interface ThreadLimits {
  threads: number
  /** Longest a file may take: the largest one allowed takes about a tenth. Below the queue's expiry. */
  timeLimitMs: number
  memoryMb: number
  /** The module whose functions the threads run. */
  filename: string
}

const usual: ThreadLimits = {
  threads: availableParallelism(),
  timeLimitMs: 25_000,
  memoryMb: 768,
  filename: fileURLToPath(new URL('./tasks.ts', import.meta.url)),
}

export function createThreads(limits: Partial<ThreadLimits> = {}): Threads {
  const { threads, timeLimitMs, memoryMb, filename } = { ...usual, ...limits }
  const pool = new Piscina({
    filename,
    execArgv: ['--import', new URL('./load-typescript.mjs', import.meta.url).href],
    minThreads: threads,
    maxThreads: threads,
    resourceLimits: { maxOldGenerationSizeMb: memoryMb },
  })
  // The clock of a piece of work starts with the work: waiting for a thread is nobody's fault.
  const slots = createSlots(threads)
  const run = async (name: string, task: unknown, transferList: ArrayBuffer[] = []) =>
    pool.run(task, { name, transferList, signal: AbortSignal.timeout(timeLimitMs) }).catch(throwNamed)
  return {
    readFile: (fetch) =>
      slots(async () => {
        const file = await fetch()
        return run('readFile', file, [file.bytes.buffer as ArrayBuffer])
      }),
    analyseSamples: (task) => slots(() => run('analyseSamples', task)),
    analyseAll: (all) => slots(() => run('analyseAll', all)),
    warm: async () => {
      await Promise.all(Array.from({ length: threads }, () => slots(() => run('warmUp', null))))
    },
    close: () => pool.close({ force: true }),
  }
}

function throwNamed(error: unknown): never {
  if (error instanceof Error) {
    if (error.name === 'AbortError') throw new ThreadEnded('time')
    if ('code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY') throw new ThreadEnded('memory')
  }
  throw error
}
