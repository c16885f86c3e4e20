/** @typedef {import('./test-runners.mjs').Result} Result */

/** @param {Result} result */
export function describeResult(result) {
  return `${result.name}: ${counts(result)} (${result.seconds.toFixed(1)} s)`
}

/**
 * The table of the runners and, as its last line, the sums over all of them.
 * @param {Result[]} results
 * @param {number} seconds that the whole took, on the clock
 */
export function reportOf(results, seconds) {
  const sum = results.reduce(
    (total, { passed, failed, skipped }) => ({
      passed: total.passed + passed,
      failed: total.failed + failed,
      skipped: total.skipped + skipped,
    }),
    { passed: 0, failed: 0, skipped: 0 },
  )
  const rows = results.map((result) =>
    row([result.name, result.passed, result.failed, result.skipped, result.seconds.toFixed(1)]),
  )
  const head = row(['', 'passed', 'failed', 'skipped', 'seconds'])
  const text = [
    '',
    head,
    ...rows,
    row(['together', sum.passed, sum.failed, sum.skipped, seconds.toFixed(1)]),
    '',
    counts(sum),
  ]
  return { text: text.join('\n'), ok: sum.failed === 0 && sum.passed > 0 }
}

/** @param {import('./test-runners.mjs').Counts} found */
function counts({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`
}

/** @param {(string | number)[]} cells */
function row([name, ...figures]) {
  return String(name).padEnd(12) + figures.map((figure) => String(figure).padStart(9)).join('')
}
