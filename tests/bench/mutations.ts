import { runMutations } from '../reference/reading/run-mutations.ts'

const FILES = 10_000
const MOST_GROWTH_MIB = 512

const mib = (bytes: number): number => bytes / 1024 / 1024

/**
 * Ten thousand damaged files from fixed seeds: none may crash the reader, hold it up, or fill its memory, and the
 * numbers of an accepted one equal those of a slow second reader, or a note says what was done.
 */
export function benchMutations(): void {
  const before = process.memoryUsage.rss()
  const start = performance.now()
  const report = runMutations(FILES)
  const seconds = (performance.now() - start) / 1000
  const growth = mib(process.memoryUsage.rss() - before)
  const share = ((100 * report.accepted) / report.files).toFixed(1)
  console.log(
    `  ${report.files} damaged files in ${seconds.toFixed(1)} s, the slowest in ${report.slowestMs.toFixed(0)} ms`,
  )
  console.log(
    `  accepted ${report.accepted} (${share} %): ${report.equal} equal to the slow reader, ${report.noted} with a note`,
  )
  console.log(`  ${report.needsMap} wait for a person's map; the others are refused with a code`)
  console.log(`  memory grew by ${growth.toFixed(0)} MiB`)
  for (const fault of report.faults) console.log(`  FAULT seed ${fault}`)
  if (report.faults.length > 0 || growth > MOST_GROWTH_MIB) process.exitCode = 1
}
