import { usualTest } from '../../shared/contracts/session-test.ts'
import { headlineOf } from '../../shared/contracts/sheet-metrics.ts'
import { setTimeout as pause } from 'node:timers/promises'
import type { SessionSheet } from '../../shared/contracts/sessions.ts'
import type { Deps } from '../../server/deps.ts'
import { publish } from '../../server/modules/sessions/publish.service.ts'
import { create } from '../../server/modules/sessions/sessions.service.ts'
import { sheet } from '../../server/modules/sessions/sheet.service.ts'
import { change } from '../../server/modules/trials/trials.service.ts'
import { seededRandom } from '../synthetic/random.ts'
import { daysEarlier, type DemoDay, demoDays, eveningOf } from './calendar.ts'
import { type DemoFile, dropFiles } from './drop-files.ts'
import { misnamed, oddFiles } from './odd-files.ts'
import { attemptsOf, cameToOther, type OtherSession, otherSessions } from './other-tests.ts'
import type { SquadOnSite } from './people.ts'
import { type AttemptsRecipe, isAway, mishapOf, type Recipe, recipeOf } from './stories.ts'
import type { FileStyle } from '../synthetic/file-styles.ts'

const trialsEach = 2
const lookEveryMs = 500

export type MakeFile = (recipe: Recipe | AttemptsRecipe, style: FileStyle) => Promise<Uint8Array>

/** All sessions of one squad, a month after the other, each published but the latest; then those of other tests. */
export async function runSquad(
  deps: Deps,
  site: SquadOnSite,
  { number, today, makeFile }: { number: number; today: Date; makeFile: MakeFile },
): Promise<void> {
  for (const day of demoDays(today, number)) {
    const files = filesOf(site, number, day, makeFile)
    const onTheDay: Deps = { ...deps, clock: () => eveningOf(day.date) }
    const { id } = await create(onTheDay, site.coach, {
      date: day.date,
      title: `${site.squad.name}: monthly jumps`,
      place: site.squad.place,
      note: null,
      test: usualTest('cmj'),
      squadIds: [site.squadId],
    })
    await dropFiles(onTheDay, site.coach, id, [...misnamed(files, day), ...oddFiles(files, number, day)])
    const analysed = await settled(onTheDay, site, id)
    await setAside(onTheDay, site, analysed)
    if (day.latest) continue
    const { version } = analysed.session
    await publish(onTheDay, site.coach, { sessionId: id, version }, { mail: false })
  }
  const latest = demoDays(today, number).find((day) => day.latest)
  for (const other of otherSessions)
    if (latest && other.squad === number) await runOther(deps, site, other, latest.date, makeFile)
}

function filesOf(
  { squad, athletes }: SquadOnSite,
  number: number,
  day: DemoDay,
  makeFile: MakeFile,
): DemoFile[] {
  const present = athletes.filter((athlete) => !isAway(athlete, day.index))
  return present.flatMap((athlete, place) => {
    const daySeed = athlete.seed * 1000 + day.index * 10
    const random = seededRandom(daySeed)
    return Array.from({ length: trialsEach }, (_, i) => {
      const mishap = mishapOf(number, day.index, place, random)
      const recipe = recipeOf(athlete, day.index, mishap, seededRandom(daySeed + 5), daySeed + 6 + i)
      return {
        fileName: squad.fileName(athlete.name, day.date, i + 1),
        bytes: () => makeFile(recipe, squad.style),
      }
    })
  })
}

/** The sheet once every file is read and every trial analysed. */
async function settled(deps: Deps, { coach }: SquadOnSite, sessionId: string): Promise<SessionSheet> {
  for (;;) {
    const now = await sheet(deps, coach, sessionId)
    const waits = now.uploads.some(({ state }) => state === 'waiting')
    if (!waits && now.trials.every(({ analysis }) => analysis)) return now
    await pause(lookEveryMs)
  }
}

/** A session of another test, published: some of the squad, a file of two attempts each. */
async function runOther(
  deps: Deps,
  site: SquadOnSite,
  { title, test, daysBefore }: OtherSession,
  latest: string,
  makeFile: MakeFile,
): Promise<void> {
  const date = daysEarlier(latest, daysBefore)
  const onTheDay: Deps = { ...deps, clock: () => eveningOf(date) }
  const { squad, squadId, coach } = site
  const { id } = await create(onTheDay, coach, {
    date,
    title: `${squad.name}: ${title}`,
    place: squad.place,
    note: null,
    test,
    squadIds: [squadId],
  })
  const files = site.athletes.slice(0, cameToOther).map((athlete): DemoFile => {
    const seed = athlete.seed * 1000 + 500 + daysBefore
    return {
      fileName: squad.fileName(athlete.name, date, 1).replace('CMJ', test.protocol),
      bytes: () => makeFile(attemptsOf(athlete, test, seed), squad.style),
    }
  })
  await dropFiles(onTheDay, coach, id, files)
  const analysed = await settled(onTheDay, site, id)
  await setAside(onTheDay, site, analysed)
  const { version } = analysed.session
  await publish(onTheDay, coach, { sessionId: id, version }, { mail: false })
}

/** The coach goes through the sheet: a trial whose jump itself failed a check is set aside, as a coach would. */
async function setAside(
  deps: Deps,
  { coach }: SquadOnSite,
  { trials, session }: SessionSheet,
): Promise<void> {
  for (const { id, version, analysis } of trials) {
    if (!analysis?.withheld.includes(headlineOf(session.test.protocol))) continue
    const setAsideReason = `Repeated: ${analysis.worstSentence ?? 'the check failed'}`.slice(0, 280)
    await change(deps, coach, id, { version, setAsideReason })
  }
}
