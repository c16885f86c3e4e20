import { deadPlates } from '../checks/feet-checks.ts'
import { squatDip } from '../checks/squat-checks.ts'
import { squatFigures } from '../metrics/squat.ts'
import { analyseJump, type JumpKind } from './jump.ts'
import type { AnalyseTrial } from './protocol.ts'

const kind: JumpKind = {
  dips: false,
  twoFeet: true,
  measurePush: squatFigures,
  checks: (model) => [deadPlates(model), squatDip(model)],
}

/** Squat jump: a push from a held squat, without going down before it. */
export const analyseSj: AnalyseTrial = (input) => analyseJump(input, kind)
