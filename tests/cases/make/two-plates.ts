import type { Case } from '../case.ts'
import { fixed, plainHead, rising, table, twoPlates } from './text.ts'
import type { Layout, MadeCase } from './text.ts'

export const { columns, channels } = twoPlates(12)
export const counts = Array.from({ length: 12 }, (_, i) => `${i + 1}`)
export const force = fixed(rising(12))
export const single = { single: rising(12) }
export const twoForces = columns.slice(1)

/** A file of two plates, but for what is said of it. */
export const made = (name: string, layout: Partial<Layout>, expected: Case): MadeCase => ({
  name,
  bytes: table({ head: [plainHead], columns, ...layout }),
  expected,
})
