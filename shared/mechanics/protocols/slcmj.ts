import { oneFootChecks } from '../checks/one-foot-checks.ts'
import { measureCounterPush } from './cmj.ts'
import { analyseJump, type JumpKind } from './jump.ts'
import type { AnalyseTrial } from './protocol.ts'

const kind: JumpKind = {
  dips: true,
  twoFeet: false,
  measurePush: measureCounterPush,
  checks: oneFootChecks,
}

/** Countermovement jump on one leg: on one plate, or on one of two, of which the other stays empty. */
export const analyseSlcmj: AnalyseTrial = (input) => analyseJump(input, kind)
