/**
 * A smooth course of acceleration over a width of 1 with its first and second integral in closed form. Beyond
 * the width it keeps `end`: 0 for a pulse, 1 for a rise.
 */
export interface Pulse {
  /** Acceleration at u, 0 ≤ u ≤ 1. */
  value: (u: number) => number
  /** ∫ value from 0 to u. */
  area: (u: number) => number
  /** ∫ area from 0 to u. */
  moment: (u: number) => number
  end: 0 | 1
}

const { PI, sin, cos } = Math

/** sin²(πu): starts and ends without a kink. */
export const raisedCosine: Pulse = {
  value: (u) => sin(PI * u) ** 2,
  area: (u) => u / 2 - sin(2 * PI * u) / (4 * PI),
  moment: (u) => u ** 2 / 4 - (1 - cos(2 * PI * u)) / (8 * PI ** 2),
  end: 0,
}

export const halfSine: Pulse = {
  value: (u) => sin(PI * u),
  area: (u) => (1 - cos(PI * u)) / PI,
  moment: (u) => (u - sin(PI * u) / PI) / PI,
  end: 0,
}

/** A polynomial Σ cₖuᵏ scaled to a height of 1. */
function polynomial(coefficients: number[], height: number): Pulse {
  const sum = (u: number, order: 0 | 1 | 2): number =>
    coefficients.reduce((total, c, k) => {
      const divisor = order === 0 ? 1 : order === 1 ? k + 1 : (k + 1) * (k + 2)
      return total + (c * u ** (k + order)) / divisor
    }, 0) / height
  return { value: (u) => sum(u, 0), area: (u) => sum(u, 1), moment: (u) => sum(u, 2), end: 0 }
}

/** u²(1−u)³, greatest at u = 2/5. */
export const earlyPeak = polynomial([0, 0, 1, -3, 3, -1], (2 / 5) ** 2 * (3 / 5) ** 3)

/** u³(1−u)², greatest at u = 3/5. */
export const latePeak = polynomial([0, 0, 0, 1, -2, 1], (3 / 5) ** 3 * (2 / 5) ** 2)

/** (1 − cos πu)/2 from 0 to 1, level at both ends. */
export const softRise: Pulse = {
  value: (u) => (1 - cos(PI * u)) / 2,
  area: (u) => u / 2 - sin(PI * u) / (2 * PI),
  moment: (u) => u ** 2 / 4 - (1 - cos(PI * u)) / (2 * PI ** 2),
  end: 1,
}

/** 1 − cos(πu/2) from 0 to 1, level at the start and steep at the end: a foot that leaves the ground. */
export const steepEnd: Pulse = {
  value: (u) => 1 - cos((PI * u) / 2),
  area: (u) => u - (2 / PI) * sin((PI * u) / 2),
  moment: (u) => u ** 2 / 2 - (4 / PI ** 2) * (1 - cos((PI * u) / 2)),
  end: 1,
}

/** sin(πu/2) from 0 to 1, steep at the start: a foot that strikes the ground. */
export const steepStart: Pulse = {
  value: (u) => sin((PI * u) / 2),
  area: (u) => (2 / PI) * (1 - cos((PI * u) / 2)),
  moment: (u) => (2 / PI) * (u - (2 / PI) * sin((PI * u) / 2)),
  end: 1,
}
