import { z } from 'zod'
import type { Protocol as AnyProtocol } from '../mechanics/types.ts'
import { limits } from './limits.ts'
import { protocolsFromBox, protocolSides, Test } from './tests.ts'

/** Tests that are also done with a load carried. */
export const protocolsWithLoad: readonly AnyProtocol[] = ['cmj', 'sj', 'slcmj']
/** Tests in which free arms change the figures, so that results with and without are apart. */
export const protocolsWithArms: readonly AnyProtocol[] = ['cmj', 'sj', 'dj', 'slcmj', 'hops']

type AnyTest<P extends AnyProtocol> = Omit<Test, 'protocol'> & { protocol: P }

/** What a test of this protocol is unless somebody says otherwise; a box is left to be given. */
export function usualTest<P extends AnyProtocol>(protocol: P): AnyTest<P> {
  const [side = 'both'] = protocolSides[protocol]
  return { protocol, side, externalLoadKg: 0, boxHeightM: null, arms: 'hips' }
}

/** What a test lacks that its protocol needs, or has that its protocol does not know: by field, in words. */
export function testFaults(test: AnyTest<AnyProtocol>): Partial<Record<keyof Test, string>> {
  const { protocol, side, externalLoadKg, boxHeightM, arms } = test
  const hasBox = protocolsFromBox.includes(protocol)
  return {
    ...(!protocolSides[protocol].includes(side) && { side: 'Choose a side that this test is done on' }),
    ...(hasBox && boxHeightM === null && { boxHeightM: 'Give the height of the box' }),
    ...(!hasBox && boxHeightM !== null && { boxHeightM: 'This test has no box' }),
    ...(externalLoadKg !== 0 &&
      !protocolsWithLoad.includes(protocol) && { externalLoadKg: 'This test is done without a load' }),
    ...(arms !== 'hips' &&
      !protocolsWithArms.includes(protocol) && { arms: 'This test makes no difference of the arms' }),
  }
}

const { externalLoadKg: load, boxHeightM: box } = limits
const loadSentence = `Give a load of ${load.min} to ${load.max} kg`
const boxSentence = `Give a height of ${box.min} to ${box.max} m`
const WellTyped = Test.extend({
  externalLoadKg: z.number(loadSentence).min(load.min, loadSentence).max(load.max, loadSentence),
  boxHeightM: z.number(boxSentence).min(box.min, boxSentence).max(box.max, boxSentence).nullable(),
})

/**
 * The test that a session's recordings are read as: with what its protocol needs and nothing that it does not know,
 * so that like results are told to be alike.
 */
export const SessionTest = WellTyped.superRefine((test, ctx) => {
  for (const [field, message] of Object.entries(testFaults(test)))
    ctx.addIssue({ code: 'custom', path: [field], message })
})
export type SessionTest = z.infer<typeof SessionTest>

/** True of two tests whose results are comparable. */
export const isSameTest = (a: Test, b: Test): boolean =>
  a.protocol === b.protocol &&
  a.side === b.side &&
  a.externalLoadKg === b.externalLoadKg &&
  a.boxHeightM === b.boxHeightM &&
  a.arms === b.arms
