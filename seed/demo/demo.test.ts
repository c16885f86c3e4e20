import { describe, expect, it } from 'vitest'
import { foldName } from '../../shared/contracts/names.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { matchAthlete } from '../../server/modules/trials/match-athlete.ts'
import { seededRandom } from '../synthetic/random.ts'
import { demoAccounts } from './accounts.ts'
import { daysEarlier, demoDays } from './calendar.ts'
import makeFile from './file-thread.ts'
import { misnamed } from './odd-files.ts'
import { attemptsOf, cameToOther, otherSessions } from './other-tests.ts'
import { demoSquads } from './squads.ts'
import { describeAthlete, isAway, mishapOf, recipeOf } from './stories.ts'

const today = new Date('2026-03-30T09:00:00Z')
const names = demoSquads.flatMap(({ athletes }) => athletes)

describe('the people of the demo club', () => {
  it('are forty-five athletes in three squads, no two of one name', () => {
    expect(demoSquads.map(({ athletes }) => athletes.length)).toEqual([15, 15, 15])
    expect(new Set(names.map(foldName)).size).toBe(45)
  })

  it('sign in with addresses of their own, of a domain that cannot exist', () => {
    const addresses = demoAccounts.map(({ email }) => email)
    expect(new Set(addresses).size).toBe(addresses.length)
    for (const email of addresses) expect(email).toMatch(/^[a-z]+(\.[a-z]+)+@saltmarsh\.example$/)
  })

  it('hold every role, and each athlete’s account is of an athlete', () => {
    const count = (role: string) =>
      demoAccounts.filter(({ roles }) => roles.some((held) => held === role)).length
    expect([count('coach'), count('physio'), count('admin')]).toEqual([3, 1, 2])
    for (const { athlete } of demoAccounts) if (athlete) expect(names).toContain(athlete)
    for (const { coach } of demoSquads) {
      expect(demoAccounts.find(({ name }) => name === coach)?.roles).toContain('coach')
    }
  })
})

describe('the files of the demo club', () => {
  it('name their athlete in the way of each squad’s program', () => {
    for (const { athletes, fileName } of demoSquads) {
      const candidates = athletes.map((name) => ({ id: name, nameKey: foldName(name) }))
      for (const name of athletes) {
        expect([name, matchAthlete(fileName(name, '2026-02-27', 2), candidates)]).toEqual([name, name])
      }
    }
  })

  it('name nobody on the latest day in a few cases', () => {
    const candidates = names.map((name) => ({ id: name, nameKey: foldName(name) }))
    const files = Array.from({ length: 30 }, () => ({
      fileName: 'mara_ostrow.csv',
      bytes: () => Promise.reject(new Error()),
    }))
    const latest = { index: 13, date: '2026-03-28', latest: true }
    const inTray = misnamed(files, latest).filter(
      ({ fileName }) => matchAthlete(fileName, candidates) === null,
    )
    expect(inTray).toHaveLength(3)
  })

  it('are made the same each time, each style readable', () => {
    for (const { style } of demoSquads) {
      const recipe = recipeOf(describeAthlete('Mara Ostrow', 1), 3, null, seededRandom(4), 5)
      const bytes = makeFile({ recipe, style })
      expect(makeFile({ recipe, style })).toEqual(bytes)
      expect(readRecording(bytes, 'x.csv').ok).toBe(true)
    }
  })

  it('hold the swapped feet that the day of the swapped cables asks for', () => {
    const mishap = mishapOf(0, 5, 0, seededRandom(1))
    expect(mishap).toBe('swappedFeet')
    expect(recipeOf(describeAthlete('Mara Ostrow', 1), 5, mishap, seededRandom(4), 5).swapped).toBe(true)
  })
})

describe('the other tests of the demo club', () => {
  it.each(otherSessions.map((other) => [other.title, other] as const))(
    'are twice in the file of each athlete, with figures that stand: %s',
    (_title, { squad, test }) => {
      const { athletes, style } = demoSquads[squad]
      for (const [i, name] of athletes.slice(0, cameToOther).entries()) {
        const recipe = attemptsOf(describeAthlete(name, squad * 15 + i), test, 900 + i)
        const read = readRecording(makeFile({ recipe, style }), 'x.csv')
        if (!read.ok) throw new Error(read.error.sentence)
        const { trials } = analyse(read.recording, { test, gravity: 9.81, calibrationU: {} })
        const fails = trials.flatMap(({ checks }) => checks.filter(({ verdict }) => verdict === 'fail'))
        expect([name, trials.length, fails.map(({ sentence }) => sentence)]).toEqual([name, 2, []])
      }
    },
  )

  it('lie between the monthly jumps of two months ago and of one', () => {
    for (const { squad, daysBefore } of otherSessions) {
      const dates = demoDays(today, squad).map(({ date }) => date)
      const date = daysEarlier(dates[13], daysBefore)
      expect([date > dates[11], date < dates[12]]).toEqual([true, true])
    }
  })
})

describe('the months of the demo club', () => {
  it.each([0, 1, 2])('are fourteen days of squad %i, in order, the latest a few days ago', (squad) => {
    const days = demoDays(today, squad)
    const dates = days.map(({ date }) => date)
    expect(dates).toHaveLength(14)
    expect(dates).toEqual([...new Set(dates)].sort())
    expect(days.map(({ latest }) => latest).indexOf(true)).toBe(13)
    expect(dates[13]).toBe(`2026-03-${28 - squad}`)
  })

  it('see an injured athlete away for two, and back with less and leaning', () => {
    const tomi = describeAthlete('Tomi Halvarden', 2)
    const present = Array.from({ length: 14 }, (_, month) => !isAway(tomi, month))
    expect(present.filter(Boolean)).toHaveLength(12)
    const jumpIn = (month: number) => recipeOf(tomi, month, null, seededRandom(1), 2).jump
    const [before, back] = [jumpIn(5), jumpIn(9)]
    expect((before.takeoffVelocity ?? 0) - (back.takeoffVelocity ?? 0)).toBeGreaterThan(0.3)
    expect((before.shares?.propulsion ?? 0) - (back.shares?.propulsion ?? 0)).toBeGreaterThan(0.08)
  })
})
