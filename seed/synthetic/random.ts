/** A seeded source of random numbers: the same seed gives the same recording on every machine. */
export interface Random {
  /** Even between 0 and 1. */
  next: () => number
  between: (from: number, to: number) => number
  /** Standard normal. */
  normal: () => number
  pick: <T>(from: readonly T[]) => T
}

/**
 * sfc32, the "small fast counter" generator of Chris Doty-Humphrey's PractRand (public domain), 128 bits of
 * state seeded from one number; normal deviates by Marsaglia's polar method (Marsaglia & Bray 1964).
 */
export function seededRandom(seed: number): Random {
  let [a, b, c, counter] = [seed | 0, (seed / 2 ** 32) | 0, 0x9e3779b9 | 0, 1]
  let spare: number | null = null
  const next = (): number => {
    const t = (((a + b) | 0) + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = (c << 21) | (c >>> 11)
    c = (c + t) | 0
    return (t >>> 0) / 2 ** 32
  }
  const normal = (): number => {
    if (spare !== null) {
      const value = spare
      spare = null
      return value
    }
    for (;;) {
      const x = 2 * next() - 1
      const y = 2 * next() - 1
      const r2 = x * x + y * y
      if (r2 === 0 || r2 >= 1) continue
      const factor = Math.sqrt((-2 * Math.log(r2)) / r2)
      spare = y * factor
      return x * factor
    }
  }
  for (let i = 0; i < 12; i++) next()
  return {
    next,
    normal,
    between: (from, to) => from + (to - from) * next(),
    pick: (from) => {
      const picked = from[Math.floor(next() * from.length)]
      if (picked === undefined) throw new RangeError('Nothing to pick from.')
      return picked
    },
  }
}
