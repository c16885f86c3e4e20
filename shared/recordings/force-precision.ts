/**
 * Force in newtons to the nearest 0.001 N, the precision in which every place stores and analyses it, so that
 * command, server and browser work on the very same numbers. Never a negative zero.
 */
export function toMillinewtonPrecision(forceN: number): number {
  return Math.round(forceN * 1000) / 1000 + 0
}
