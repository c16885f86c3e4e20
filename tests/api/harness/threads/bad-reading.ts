import * as tasks from '../../../../server/jobs/threads/tasks.ts'

export const { analyseAll, analyseSamples, warmUp } = tasks

/** Reads as the product does, but is led astray by the names of files: loops, hoards or throws. */
export function readFile(file: tasks.ReadFile): ReturnType<typeof tasks.readFile> {
  if (file.fileName === 'endless.csv') {
    file.began?.postMessage(null)
    for (;;);
  }
  const hoard: number[][] = []
  while (file.fileName === 'greedy.csv') hoard.push(Array.from({ length: 10_000 }, Math.random))
  if (file.fileName === 'fails.csv') throw new Error('as asked')
  return tasks.readFile(file)
}
