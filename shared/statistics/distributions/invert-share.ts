const MOST_STEPS = 100
/** A share so far below the target is a step too long: its digits, or those of its density, may be gone. */
const FAR_BELOW = 1e-30

/**
 * Solves share(u) = target for a rising share with density d(share)/du, by Newton's method on the logarithms.
 * Where the density is log-concave so is the share (Bagnoli, Bergstrom 2005, Econ Theory 26:445–469): the logarithm is
 * concave, so that after the first step Newton's method comes from below and cannot miss. That first step may reach too
 * far down; then it is halved. `target` is at most ½, for the smaller share keeps its digits. NaN where
 * the share is, and where the density vanishes.
 */
export function invertShare(
  target: number,
  share: (u: number) => number,
  density: (u: number) => number,
  start: number,
): number {
  let u = start
  let here = share(u)
  for (let n = 0; n < MOST_STEPS; n++) {
    let step = (Math.log(target / here) * here) / density(u)
    if (!Number.isFinite(step)) return NaN
    let next = share(u + step)
    while (next < target * FAR_BELOW && step !== 0) {
      step /= 2
      next = share(u + step)
    }
    u += step
    here = next
    if (!(Math.abs(step) > 4 * Number.EPSILON * Math.max(1, Math.abs(u)))) return u
  }
  return u
}
