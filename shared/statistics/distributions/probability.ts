/** Refuses what is no probability strictly between 0 and 1, and degrees of freedom that are not above 0. */
export function checkProbability(p: number, ...degreesOfFreedom: number[]): void {
  if (!(p > 0 && p < 1)) throw new RangeError(`A probability lies between 0 and 1, this is ${p}.`)
  for (const dof of degreesOfFreedom)
    if (!(dof > 0)) throw new RangeError(`Degrees of freedom are above 0, these are ${dof}.`)
}
