import { z } from 'zod'
import type { ColumnMap } from '../recordings/result.ts'

const column = { index: z.int().min(0).max(9999), name: z.string().max(400) }

const channels = ['left', 'right', 'single', 'total'] as const
type Channel = (typeof channels)[number]

/** Both feet, or one sum: what a recording can hold. */
function isWhole(used: ReadonlySet<Channel>): boolean {
  return used.size === 1
    ? !used.has('left') && !used.has('right')
    : used.size === 2 && used.has('left') && used.has('right')
}

/** A column map as it travels and as an analyst writes it into a file. */
export const columnMapSchema = z
  .strictObject({
    time: z
      .strictObject({
        ...column,
        unit: z.enum(['s', 'ms', 'us', 'min', 'samples', 'clock']),
        within: z.strictObject({ ...column, samplesPerFrame: z.int().min(1).max(100_000) }).optional(),
      })
      .nullable(),
    forces: z
      .array(
        z.strictObject({
          ...column,
          unit: z.enum(['N', 'kN', 'kgf', 'lbf', 'BW', '%BW']),
          channel: z.enum(channels),
          downward: z.literal(true).optional(),
        }),
      )
      .min(1)
      .max(64),
    sampleRateHz: z.number().min(1).max(100_000).optional(),
  })
  .refine(({ forces }) => isWhole(new Set(forces.map(({ channel }) => channel))), {
    message: 'Name forces for left and right, or for single, or for total.',
    path: ['forces'],
  })
  .refine(
    ({ time, forces }) => {
      const used = [time?.index, time?.within?.index, ...forces.map(({ index }) => index)]
      const named = used.filter((index) => index !== undefined)
      return new Set(named).size === named.length
    },
    { message: 'Each column can be one thing only.', path: ['forces'] },
  ) satisfies z.ZodType<ColumnMap>
