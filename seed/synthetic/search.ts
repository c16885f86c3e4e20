/** Searches on continuous functions of time: a coarse grid first, then halving. Times in seconds. */
type Course = (timeS: number) => number

/** Step of the coarse grid: shorter than any feature of the synthetic forces. */
const GRID_S = 0.0005
const HALVINGS = 50

/** Where `course` changes sign between `low` and `high`, which must lie on either side. */
export function zeroBetween(course: Course, low: number, high: number): number {
  const sign = Math.sign(course(low))
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2
    if (Math.sign(course(middle)) === sign) low = middle
    else high = middle
  }
  return (low + high) / 2
}

/** First instant after `from` at which `course` has changed sign, or null by `to`. */
export function firstZero(course: Course, from: number, to: number): number | null {
  const sign = Math.sign(course(from))
  for (let t = from + GRID_S; t <= to; t += GRID_S) {
    if (Math.sign(course(t)) !== sign) return zeroBetween(course, t - GRID_S, t)
  }
  return null
}

/** Last instant before `from` at which `course` changed sign, or null back to `to`. */
export function lastZero(course: Course, from: number, to: number): number | null {
  return reversed(firstZero((t) => course(-t), -from, -to))
}

function reversed(timeS: number | null): number | null {
  return timeS === null ? null : -timeS
}

/** The greatest value between two instants and where it is. */
export function greatest(course: Course, from: number, to: number): { timeS: number; value: number } {
  let [best, height] = [from, -Infinity]
  for (let t = from; t <= to; t += GRID_S) {
    const value = course(t)
    if (value > height) [best, height] = [t, value]
  }
  let [low, high] = [Math.max(from, best - GRID_S), Math.min(to, best + GRID_S)]
  for (let i = 0; i < HALVINGS; i++) {
    const [a, b] = [low + (high - low) / 3, high - (high - low) / 3]
    if (course(a) < course(b)) low = a
    else high = b
  }
  const timeS = (low + high) / 2
  return { timeS, value: course(timeS) }
}

export function least(course: Course, from: number, to: number): { timeS: number; value: number } {
  const { timeS, value } = greatest((t) => -course(t), from, to)
  return { timeS, value: -value }
}

/** Nodes and weights of the five-point Gauss–Legendre rule (Abramowitz & Stegun, table 25.4). */
const GAUSS = [
  [0, 0.5688888888888889],
  [0.5384693101056831, 0.47862867049936647],
  [-0.5384693101056831, 0.47862867049936647],
  [0.906179845938664, 0.23692688505618908],
  [-0.906179845938664, 0.23692688505618908],
] as const

/** ∫ course from `from` to `to` by Gauss's five-point rule on pieces of about 2 ms. */
export function integral(course: Course, from: number, to: number): number {
  const pieces = Math.max(1, Math.ceil((to - from) / 0.002))
  const half = (to - from) / pieces / 2
  let sum = 0
  for (let i = 0; i < pieces; i++) {
    const middle = from + (2 * i + 1) * half
    for (const [node, weight] of GAUSS) sum += weight * course(middle + half * node)
  }
  return sum * half
}
