/**
 * Student's t from the normal deviate x of the same probability, in powers of 1/dof to the third (Fisher, Cornish 1960,
 * Technometrics 2:209–225; Abramowitz, Stegun 1964, 26.7.5). Good to a millionth from 30 degrees of freedom.
 */
export function cornishFisherT(x: number, dof: number): number {
  const x2 = x * x
  const g1 = (x * (x2 + 1)) / 4
  const g2 = (x * ((5 * x2 + 16) * x2 + 3)) / 96
  const g3 = (x * (((3 * x2 + 19) * x2 + 17) * x2 - 15)) / 384
  return x + (g1 + (g2 + g3 / dof) / dof) / dof
}
