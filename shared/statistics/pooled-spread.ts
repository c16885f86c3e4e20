/** How much an athlete's trials vary within a session, pooled over athletes, and how well that is known. */
export interface PooledSpread {
  /** Standard deviation from trial to trial, in the metric's unit. */
  sd: number
  degreesOfFreedom: number
}

/**
 * The within-athlete standard deviation of several athletes' trials: √(ΣΣ(x − x̄ᵢ)² / Σ(nᵢ − 1)), which is √MSW of
 * a one-way analysis of variance, the typical error of a group (Hopkins 2000, Sports Med 30:1–15). Two trials of
 * one athlete know their own spread hardly at all (Student's t of 12.7); those of a squad know it well, if its
 * athletes vary alike. null where nobody has two trials.
 */
export function pooledSpread(trialsByAthlete: readonly (readonly number[])[]): PooledSpread | null {
  let squares = 0
  let degreesOfFreedom = 0
  for (const trials of trialsByAthlete) {
    if (trials.length < 2) continue
    const mean = trials.reduce((sum, value) => sum + value, 0) / trials.length
    for (const value of trials) squares += (value - mean) ** 2
    degreesOfFreedom += trials.length - 1
  }
  return degreesOfFreedom === 0 ? null : { sd: Math.sqrt(squares / degreesOfFreedom), degreesOfFreedom }
}
