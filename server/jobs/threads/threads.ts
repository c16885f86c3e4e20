import { availableParallelism } from 'node:os'
import { fileURLToPath } from 'node:url'
import { MessageChannel, type MessagePort } from 'node:worker_threads'
import { Piscina } from 'piscina'
import { isZip } from '../../modules/uploads/archive/package-kind.ts'
import { createSlots } from './slots.ts'
import type * as tasks from './tasks.ts'

/** Reading and computing, away from the thread that talks to the database. */
export interface Threads {
  /** The file is fetched when its turn has come: no more files are in memory than there are threads. */
  readFile(fetch: () => Promise<Omit<tasks.ReadFile, 'began'>>): ReturnType<typeof tasks.readFile>
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
  /** Longest a piece of work may take, the start of its thread included. Below the queue's expiry. */
  timeLimitMs: number
  /** Longest a file may be read, from its first byte: the largest one allowed takes less than half of it. */
  readTimeLimitMs: number
  /** The same for workbooks and archives, which are unpacked first. */
  unpackTimeLimitMs: number
  memoryMb: number
  /** The module whose functions the threads run. */
  filename: string
}

const usual: ThreadLimits = {
  threads: availableParallelism(),
  timeLimitMs: 25_000,
  readTimeLimitMs: 2_000,
  unpackTimeLimitMs: 20_000,
  memoryMb: 768,
  filename: fileURLToPath(new URL('./tasks.ts', import.meta.url)),
}

export function createThreads(limits: Partial<ThreadLimits> = {}): Threads {
  const { threads, timeLimitMs, readTimeLimitMs, unpackTimeLimitMs, memoryMb, filename } = {
    ...usual,
    ...limits,
  }
  const pool = new Piscina({
    filename,
    execArgv: ['--import', new URL('./load-typescript.mjs', import.meta.url).href],
    minThreads: threads,
    maxThreads: threads,
    resourceLimits: { maxOldGenerationSizeMb: memoryMb },
  })
  // The clock of a piece of work starts with the work: waiting for a thread is nobody's fault.
  const slots = createSlots(threads)
  const run = async (name: string, task: unknown, { signal, transferList = [] }: RunLimits = {}) =>
    pool
      .run(task, { name, transferList, signal: signal ?? AbortSignal.timeout(timeLimitMs) })
      .catch(throwNamed)
  return {
    readFile: (fetch) =>
      slots(async () => {
        const file = await fetch()
        const most = isZip(file.bytes) ? unpackTimeLimitMs : readTimeLimitMs
        return timedFromBegin(most, timeLimitMs, ({ began, signal }) =>
          run(
            'readFile',
            { ...file, began },
            { signal, transferList: [file.bytes.buffer as ArrayBuffer, began] },
          ),
        )
      }),
    analyseSamples: (task) => slots(() => run('analyseSamples', task)),
    analyseAll: (all) => slots(() => run('analyseAll', all)),
    warm: async () => {
      await Promise.all(Array.from({ length: threads }, () => slots(() => run('warmUp', null))))
    },
    close: () => pool.close({ force: true }),
  }
}

interface RunLimits {
  signal?: AbortSignal
  transferList?: (ArrayBuffer | MessagePort)[]
}

/**
 * Runs work that says on `began` when it begins, and ends it `mostMs` later: a thread that has yet to start, after
 * another was ended, takes longer than many a file. It ends after `mostInAllMs` in any case.
 */
async function timedFromBegin<Result>(
  mostMs: number,
  mostInAllMs: number,
  work: (limit: { began: MessagePort; signal: AbortSignal }) => Promise<Result>,
): Promise<Result> {
  const { port1, port2 } = new MessageChannel()
  const ending = new AbortController()
  const end = () => ending.abort()
  const timers = [setTimeout(end, mostInAllMs)]
  port1.once('message', () => timers.push(setTimeout(end, mostMs)))
  try {
    return await work({ began: port2, signal: ending.signal })
  } finally {
    timers.forEach(clearTimeout)
    port1.close()
  }
}

function throwNamed(error: unknown): never {
  if (error instanceof Error) {
    if (error.name === 'AbortError') throw new ThreadEnded('time')
    if ('code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY') throw new ThreadEnded('memory')
  }
  throw error
}
