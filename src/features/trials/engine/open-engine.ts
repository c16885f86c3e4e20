import type { EngineReply, EngineTasks } from './engine-tasks.ts'

/** The engine beside the page: what it computes never holds the page up. */
export interface Engine {
  /** @throws Error where the engine could not answer, or was closed first. */
  ask<Kind extends keyof EngineTasks>(
    kind: Kind,
    question: EngineTasks[Kind]['ask'],
  ): Promise<EngineTasks[Kind]['answer']>
  close(): void
}

interface Waiting {
  resolve: (answer: never) => void
  reject: (error: Error) => void
}

/** Starts a worker of its own, which lives until it is closed. */
export function openEngine(): Engine {
  const worker = new Worker(new URL('./engine.worker.ts', import.meta.url), { type: 'module' })
  const waiting = new Map<number, Waiting>()
  let last = 0
  const failAll = (error: Error) => {
    for (const { reject } of waiting.values()) reject(error)
    waiting.clear()
  }
  worker.addEventListener('message', ({ data: reply }: MessageEvent<EngineReply>) => {
    const asker = waiting.get(reply.id)
    waiting.delete(reply.id)
    if ('failed' in reply) asker?.reject(new Error(reply.failed))
    else asker?.resolve(reply.answer as never)
  })
  worker.addEventListener('error', () =>
    failAll(new Error('The engine could not be started in this browser.')),
  )
  return {
    ask: (kind, ask) =>
      new Promise((resolve, reject) => {
        last += 1
        waiting.set(last, { resolve, reject })
        worker.postMessage({ id: last, kind, ask })
      }),
    close: () => {
      worker.terminate()
      failAll(new Error('The engine was closed.'))
    },
  }
}
