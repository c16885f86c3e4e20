import { deadPlates } from '../checks/feet-checks.ts'
import { counterImpulses } from '../metrics/impulse.ts'
import { heightAboveStanding } from '../metrics/jump.ts'
import { pushFigures } from '../metrics/push.ts'
import { pushForceFigures } from '../metrics/push-forces.ts'
import { analyseJump, type JumpKind } from './jump.ts'
import type { AnalyseTrial } from './protocol.ts'

/** Figures of a push that begins in stance with a countermovement. */
export const measureCounterPush: JumpKind['measurePush'] = (model, times, takeoffVelocity, into) => {
  heightAboveStanding(model, times, takeoffVelocity, into)
  counterImpulses(model, takeoffVelocity, into)
  pushForceFigures(model, times, takeoffVelocity, into)
  pushFigures(model, times, takeoffVelocity, into)
}

const kind: JumpKind = {
  dips: true,
  twoFeet: true,
  measurePush: measureCounterPush,
  checks: (model) => [deadPlates(model)],
}

/** Countermovement jump on two feet. */
export const analyseCmj: AnalyseTrial = (input) => analyseJump(input, kind)
