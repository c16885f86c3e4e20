import { z } from 'zod'
import { analysedProtocols } from '../mechanics/protocols/analysed.ts'
import type { Protocol as AnyProtocol } from '../mechanics/types.ts'
import { limits } from './limits.ts'

/** The tests that are offered: those that the engine analyses. */
export const Protocol = z.enum(analysedProtocols)
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

export { protocolNames } from '../mechanics/protocols/names.ts'

/** The sides on which a test is done, the usual one first. */
export const protocolSides: Readonly<Record<AnyProtocol, readonly z.infer<typeof Side>[]>> = {
  cmj: ['both'],
  sj: ['both'],
  dj: ['both'],
  slcmj: ['left', 'right'],
  dropLanding: ['both', 'left', 'right'],
  hops: ['both'],
}

/** The tests that begin on a box. */
export const protocolsFromBox: readonly AnyProtocol[] = ['dj', 'dropLanding']

/** What makes two results comparable, as one stable text: `cmj/both/0kg/-/hips`. */
export function testKey(test: Test): string {
  const box = test.boxHeightM === null ? '-' : `${test.boxHeightM}m`
  return [test.protocol, test.side, `${test.externalLoadKg}kg`, box, test.arms].join('/')
}
