import type { Attempt } from './attempts.ts'
import type { Fade } from './body-noise.ts'
import { beginAt, goOn, shift } from './course.ts'
import type { Course } from './course.ts'
import { fromBox, heightBefore, layAttempt } from './lay-attempt.ts'
import type { ShareStep, Span, TrialMarks } from './lay-attempt.ts'
import type { Step } from './steps.ts'

/** Time in which the plates are left when stepping off, and loaded when stepping on, s. */
const STEP_OFF_S = 0.12
const STEP_ON_S = 0.3
/** Time away from the plates where nothing is said, s. */
const AWAY_S = 2

/** All attempts of a recording on one course, and when the plates carry the athlete. */
export interface Scene {
  course: Course
  marks: readonly TrialMarks[]
  fades: readonly Fade[]
  shares: readonly ShareStep[]
  /** How much of the body the plates carry, 1 at first. */
  support: readonly Step[]
  unloaded: readonly Span[]
  /** Since when the athlete is beside the plates, and for how long; null: on them. */
  away: { sinceS: number; forS: number } | null
}

/** Brings the athlete to where the attempt begins: on the plates, or on the box. */
function enter(scene: Scene, attempt: Attempt, gravity: number): Scene {
  if (!fromBox(attempt)) {
    if (!scene.away) return scene
    const on = { atS: scene.course.timeS + scene.away.forS, widthS: STEP_ON_S, to: 1 }
    const course = goOn(goOn(scene.course, scene.away.forS), STEP_ON_S)
    return { ...scene, course, support: [...scene.support, on], away: null }
  }
  if (scene.marks.length === 0) return scene
  if (!scene.away) throw new RangeError('To jump from a box the athlete must have left the plates.')
  const course = shift(scene.course, heightBefore(gravity, attempt), scene.away.forS)
  const calm: Fade = { atS: scene.away.sinceS + STEP_OFF_S, widthS: 0.5, by: -1 }
  return { ...scene, course, fades: [...scene.fades, calm] }
}

function leave(scene: Scene, attempt: Attempt): Scene {
  const course = goOn(scene.course, attempt.settleS)
  const sinceS = stepOffOf(scene.marks.at(-1), attempt) ?? (attempt.leavesForS === null ? null : course.timeS)
  if (sinceS === null) return { ...scene, course }
  const off = { atS: sinceS, widthS: STEP_OFF_S, to: 0 }
  const away = { sinceS, forS: attempt.leavesForS ?? AWAY_S }
  return { ...scene, course, support: [...scene.support, off], away }
}

/** When the athlete leaves the plates in or after the landing, or null. */
export function stepOffOf(marks: TrialMarks | undefined, { stepOffAfterS }: Attempt): number | null {
  if (!marks || stepOffAfterS === null) return null
  return (marks.flights.at(-1)?.toS ?? marks.arrivalS ?? marks.fromS) + stepOffAfterS
}

function act(before: Scene, attempt: Attempt, gravity: number): Scene {
  const scene = enter(before, attempt, gravity)
  const laid = layAttempt(scene.course, gravity, attempt)
  const { arrivalS, flights } = laid.marks
  const fall = arrivalS === null ? [] : [{ fromS: scene.away ? scene.course.timeS : 0, toS: arrivalS }]
  // Back on the plates at the first touch: the change is over, unseen, within the fall.
  const back = arrivalS === null || !scene.away ? [] : [{ atS: arrivalS - 0.1, widthS: 0.05, to: 1 }]
  const acted: Scene = {
    course: laid.course,
    marks: [...scene.marks, laid.marks],
    fades: [...scene.fades, ...laid.fades],
    shares: [...scene.shares, ...laid.shares],
    support: [...scene.support, ...back],
    unloaded: [...scene.unloaded, ...fall, ...flights],
    away: null,
  }
  return leave(acted, attempt)
}

/** The attempts, one after the other. */
export function sceneOf(attempts: readonly Attempt[], gravity: number): Scene {
  const originM = attempts[0] ? heightBefore(gravity, attempts[0]) : 0
  const course = beginAt(originM)
  const none: Scene = { course, marks: [], fades: [], shares: [], support: [], unloaded: [], away: null }
  return attempts.reduce((scene, attempt) => act(scene, attempt, gravity), none)
}
