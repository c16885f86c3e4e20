import { coverageByMetric } from './coverage.ts'
import { brokenLimits, limits } from './coverage-limits.ts'
import { measureOnAllCores } from './coverage-pool.ts'
import { coverageTable, strataTable } from './coverage-table.ts'
import { engineProtocols } from './engine-protocols.ts'

const TRIALS = 2000

async function ofProtocol(protocol: (typeof engineProtocols)[number], count: number): Promise<string> {
  const coverage = coverageByMetric(await measureOnAllCores(protocol, count))
  const broken = Object.entries(coverage).flatMap(([metric, of]) => brokenLimits(metric, of))
  return [
    `Coverage of U over ${count} synthetic trials of ${protocol}`,
    coverageTable(coverage),
    ...Object.entries(coverage).map(([metric, of]) => strataTable(metric, of)),
    broken.length === 0 ? 'All limits hold.' : `Limits broken: ${broken.join('; ')}.`,
  ].join('\n\n')
}

async function ofLaboratory(count: number): Promise<string> {
  const coverage = coverageByMetric(await measureOnAllCores('laboratory', count))
  const sd = coverage.takeoffVelocity?.sd ?? NaN
  const limit = `SD of takeoff velocity ${(1000 * sd).toFixed(2)} mm/s, limit ${1000 * limits.laboratorySd} mm/s`
  return [
    `Coverage over ${count} countermovement jumps in a clean laboratory`,
    coverageTable(coverage),
    limit,
  ].join('\n\n')
}

/** Each protocol that the engine knows, and the clean laboratory. */
export const coverageParts: readonly string[] = [...engineProtocols, 'laboratory']

/**
 * Prints how well the engine's intervals hold over synthetic trials of every protocol that it knows, and how exact
 * it is in a clean laboratory; or only the parts named.
 */
export async function benchCoverage(parts: readonly string[] = []): Promise<void> {
  const isAsked = (part: string): boolean => parts.length === 0 || parts.includes(part)
  for (const protocol of engineProtocols.filter(isAsked))
    process.stdout.write(`${await ofProtocol(protocol, TRIALS)}\n\n`)
  if (isAsked('laboratory')) process.stdout.write(`${await ofLaboratory(TRIALS)}\n`)
}
