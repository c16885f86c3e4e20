import { motionOf } from './motion.ts'
import type { Component, Motion } from './motion.ts'
import { raisedCosine } from './pulses.ts'

/** A motion in the making: it begins at rest at `originM`, and what has been laid so far brings it to `timeS`. */
export interface Course {
  originM: number
  components: readonly Component[]
  timeS: number
  /** The instants at which its parts meet: between two of them it is smooth. */
  jointsS: readonly number[]
}

export const beginAt = (originM: number): Course => ({ originM, components: [], timeS: 0, jointsS: [0] })

export const motionOfCourse = ({ components, originM }: Course): Motion => motionOf(components, originM)

/** Velocity and displacement that a course has come to. */
export function endOf(course: Course): { velocity: number; displacement: number } {
  const { velocity, displacement } = motionOfCourse(course)
  return { velocity: velocity(course.timeS), displacement: displacement(course.timeS) }
}

/** Goes on for `durationS`, with more components or as it is. */
export function goOn(course: Course, durationS: number, components: readonly Component[] = []): Course {
  const timeS = course.timeS + durationS
  const joints = [course.timeS, timeS, ...components.flatMap(({ start, width }) => [start, start + width])]
  return {
    ...course,
    components: [...course.components, ...components],
    timeS,
    jointsS: [...new Set([...course.jointsS, ...joints])].sort((a, b) => a - b),
  }
}

/** Two opposite sin² pulses of width T and amplitude a, which move by a·T²/2 and leave no velocity. */
export function shiftPulses(byM: number, start: number, durationS: number): Component[] {
  const half = durationS / 2
  const amplitude = (2 * byM) / half ** 2
  return [
    { pulse: raisedCosine, start, width: half, amplitude },
    { pulse: raisedCosine, start: start + half, width: half, amplitude: -amplitude },
  ]
}

/** Moves by `byM` from rest to rest. */
export const shift = (course: Course, byM: number, durationS: number): Course =>
  goOn(course, durationS, shiftPulses(byM, course.timeS, durationS))
