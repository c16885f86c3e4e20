import type { Attempt } from './attempts.ts'
import type { Fade } from './body-noise.ts'
import { endOf, goOn, shift } from './course.ts'
import type { Course } from './course.ts'
import { counterMove, fly, land, lowestOf, rebound, squatPush, squatTravel, stepDown } from './movements.ts'
import { stepDownDistance } from './movements.ts'
import type { Pushed } from './movements.ts'
import type { AttemptFrame, LandingOptions, LeftShares } from './options.ts'

export interface Span {
  fromS: number
  toS: number
}

/** From `atS` on, the left foot's share goes to `to`. */
export interface ShareStep {
  atS: number
  to: number
}

/** Instants of one trial at which the force is zero or the body at rest, known from how it was made. */
export interface TrialMarks {
  /** Where the quiet stance, or the empty plates under an athlete on a box, begin. */
  fromS: number
  /** The body leaves rest on the plates; null where it comes from a box. */
  startS: number | null
  /** The feet strike the plates after the drop; null without one. */
  arrivalS: number | null
  /** From the force's reaching zero to its leaving it. */
  flights: readonly Span[]
  landingEndS: number
  /** The body is back in standing. */
  restS: number
}

/** One attempt laid on the course, and what it asks of the body's unrest and of the two feet. */
export interface Laid {
  course: Course
  marks: TrialMarks
  fades: readonly Fade[]
  shares: readonly ShareStep[]
}

type Start = Pick<TrialMarks, 'fromS' | 'startS' | 'arrivalS'> & Pick<Laid, 'fades' | 'shares'>

/** Quiet goes over into a push without a dip within this time, s. */
const SQUAT_CALM_S = 0.25

const middleOf = ({ fromS, toS }: Span): number => (fromS + toS) / 2

function flight(course: Course, gravity: number, lowerM: number): { course: Course; span: Span } {
  const touched = fly(course, gravity, lowerM)
  return { course: touched, span: { fromS: course.timeS, toS: touched.timeS } }
}

/** Lands from the air, and rises to standing. */
function finish(
  course: Course,
  gravity: number,
  attempt: AttemptFrame & LandingOptions,
  start: Start,
  flights: readonly Span[],
): Laid {
  const { fromS, startS, arrivalS, fades, shares } = start
  const landed = land(course, gravity, attempt)
  const restS = landed.course.timeS
  const last = flights.at(-1)
  return {
    course: landed.course,
    marks: { fromS, startS, arrivalS, flights, landingEndS: landed.landingEndS, restS },
    fades: [...fades, { atS: landed.landingEndS, widthS: restS - landed.landingEndS, by: 1 }],
    shares: [
      ...shares,
      { atS: last ? middleOf(last) : fromS, to: attempt.shares.landing },
      { atS: restS, to: attempt.shares.stance },
    ],
  }
}

function standingStart(fromS: number, pushed: Pushed, { stance, ...shares }: LeftShares): Start {
  const { startS, pushFromS } = pushed
  return {
    fromS,
    startS,
    arrivalS: null,
    fades: [{ atS: startS, widthS: pushFromS - startS, by: -1 }],
    shares: [
      { atS: fromS, to: stance },
      { atS: startS, to: shares.unweighting },
      { atS: pushFromS, to: shares.braking },
      { atS: lowestOf(pushed), to: shares.propulsion },
    ],
  }
}

function layCountermovement(
  course: Course,
  gravity: number,
  attempt: Extract<Attempt, { protocol: 'cmj' | 'slcmj' }>,
): Laid {
  const pushed = counterMove(goOn(course, attempt.stanceS), gravity, attempt)
  const { course: touched, span } = flight(pushed.course, gravity, attempt.landsLowerM)
  return finish(touched, gravity, attempt, standingStart(course.timeS, pushed, attempt.shares), [span])
}

type SquatJump = Extract<Attempt, { protocol: 'sj' }>

/** How far under standing the squat is held, m, negative: as deep as the push is long. */
const squatHeight = (gravity: number, attempt: SquatJump): number =>
  attempt.takeoffHeightM - squatTravel(gravity, attempt)

function laySquatJump(course: Course, gravity: number, attempt: SquatJump): Laid {
  const { standsFirstS, loweringS, stanceS, shares, landsLowerM } = attempt
  const isDown = course.timeS === 0 && standsFirstS === null
  const down = isDown
    ? course
    : shift(goOn(course, standsFirstS ?? 0), squatHeight(gravity, attempt), loweringS)
  const pushed = squatPush(goOn(down, stanceS), gravity, attempt)
  const start: Start = {
    fromS: down.timeS,
    startS: pushed.startS,
    arrivalS: null,
    fades: [{ atS: pushed.startS, widthS: SQUAT_CALM_S, by: -1 }],
    shares: [
      { atS: course.timeS, to: shares.stance },
      { atS: pushed.startS, to: shares.propulsion },
    ],
  }
  const { course: touched, span } = flight(pushed.course, gravity, landsLowerM)
  return finish(touched, gravity, attempt, start, [span])
}

type Drop = Extract<Attempt, { protocol: 'dj' | 'dropLanding' }>

function arrive(course: Course, gravity: number, attempt: Drop, share: number): [Course, Start] {
  const arrived = stepDown(goOn(course, attempt.stanceS), gravity, attempt.dropHeightM)
  const shares = [{ atS: course.timeS, to: share }]
  return [arrived, { fromS: course.timeS, startS: null, arrivalS: arrived.timeS, fades: [], shares }]
}

function layDropLanding(
  course: Course,
  gravity: number,
  attempt: Extract<Attempt, { protocol: 'dropLanding' }>,
): Laid {
  const [arrived, start] = arrive(course, gravity, attempt, attempt.shares.landing)
  return finish(arrived, gravity, attempt, start, [])
}

function layDropJump(course: Course, gravity: number, attempt: Extract<Attempt, { protocol: 'dj' }>): Laid {
  const { shares, contactS } = attempt
  const [arrived, start] = arrive(course, gravity, attempt, shares.braking)
  const bounced = rebound(arrived, gravity, attempt)
  const { course: touched, span } = flight(bounced, gravity, attempt.landsLowerM)
  const turn = { atS: arrived.timeS + contactS / 2, to: shares.propulsion }
  return finish(touched, gravity, attempt, { ...start, shares: [...start.shares, turn] }, [span])
}

function layHops(course: Course, gravity: number, attempt: Extract<Attempt, { protocol: 'hops' }>): Laid {
  const { shares, touchHeightM, stanceS, contacts } = attempt
  const lower = (left: Course): number =>
    touchHeightM === null ? 0 : endOf(left).displacement - touchHeightM
  const pushed = counterMove(goOn(course, stanceS), gravity, attempt)
  const start = standingStart(course.timeS, pushed, shares)
  const steps: ShareStep[] = []
  let air = flight(pushed.course, gravity, lower(pushed.course))
  const flights = [air.span]
  for (const contact of contacts) {
    steps.push(
      { atS: middleOf(air.span), to: shares.braking },
      { atS: air.span.toS + contact.contactS / 2, to: shares.propulsion },
    )
    const bounced = rebound(air.course, gravity, contact)
    air = flight(bounced, gravity, lower(bounced))
    flights.push(air.span)
  }
  return finish(air.course, gravity, attempt, { ...start, shares: [...start.shares, ...steps] }, flights)
}

/** Height of the body above standing before an attempt begins, m: in the squat, or on the box. */
export function heightBefore(gravity: number, attempt: Attempt): number {
  if (attempt.protocol === 'sj') return attempt.standsFirstS === null ? squatHeight(gravity, attempt) : 0
  if (attempt.protocol !== 'dj' && attempt.protocol !== 'dropLanding') return 0
  return attempt.touchHeightM + stepDownDistance(gravity, attempt.dropHeightM)
}

/** Whether an attempt begins beside the plates. */
export const fromBox = (attempt: Attempt): attempt is Drop =>
  attempt.protocol === 'dj' || attempt.protocol === 'dropLanding'

/** Goes on with one attempt, from rest to rest in standing. */
export function layAttempt(course: Course, gravity: number, attempt: Attempt): Laid {
  switch (attempt.protocol) {
    case 'cmj':
    case 'slcmj':
      return layCountermovement(course, gravity, attempt)
    case 'sj':
      return laySquatJump(course, gravity, attempt)
    case 'dj':
      return layDropJump(course, gravity, attempt)
    case 'dropLanding':
      return layDropLanding(course, gravity, attempt)
    case 'hops':
      return layHops(course, gravity, attempt)
  }
}
