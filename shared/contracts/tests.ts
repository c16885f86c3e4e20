import { z } from 'zod'
import { limits } from './limits.ts'

export const Protocol = z.enum(['cmj'])
export const Side = z.enum(['both', 'left', 'right'])
export const Arms = z.enum(['hips', 'free'])

export const Test = z.strictObject({
  protocol: Protocol,
  side: Side,
  externalLoadKg: z.number().min(limits.externalLoadKg.min).max(limits.externalLoadKg.max),
  boxHeightM: z.number().positive().max(2).nullable(),
  arms: Arms,
})
export type Test = z.infer<typeof Test>

export const protocolNames: Record<z.infer<typeof Protocol>, string> = { cmj: 'Countermovement jump' }

/** What makes two results comparable, as one stable text: `cmj/both/0kg/-/hips`. */
export function testKey(test: Test): string {
  const box = test.boxHeightM === null ? '-' : `${test.boxHeightM}m`
  return [test.protocol, test.side, `${test.externalLoadKg}kg`, box, test.arms].join('/')
}
