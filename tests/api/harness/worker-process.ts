import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { fileURLToPath } from 'node:url'
import type { Harness } from './harness.ts'

/** The worker as a process of its own, for what only its death can show. */
export function spawnWorker({ database }: Pick<Harness, 'database'>): ChildProcess {
  return spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
    cwd: fileURLToPath(new URL('../../..', import.meta.url)),
    env: { ...process.env, NODE_ENV: 'test', DATABASE_WORKER_URL: database.workerUrl },
    stdio: 'ignore',
  })
}

/** Ends it as a machine that loses its power does. */
export async function kill(child: ChildProcess): Promise<void> {
  const ended = once(child, 'exit')
  child.kill('SIGKILL')
  await ended
}

/** A module of the threads that goes wrong as its name says. */
export const threadModule = (name: 'bad-reading' | 'no-analysis'): string =>
  fileURLToPath(new URL(`./threads/${name}.ts`, import.meta.url))
