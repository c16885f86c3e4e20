/** No statistic has fewer, and further down quantiles run out of the range of a number. */
const FEWEST = 0.1

/** Refuses what is no probability strictly between 0 and 1, and degrees of freedom below a tenth or that are none. */
export function checkProbability(p: number, ...degreesOfFreedom: number[]): void {
  if (!(p > 0 && p < 1)) throw new RangeError(`A probability lies between 0 and 1, this is ${p}.`)
  for (const dof of degreesOfFreedom)
    if (!(dof >= FEWEST)) throw new RangeError(`Degrees of freedom are at least ${FEWEST}, these are ${dof}.`)
}
