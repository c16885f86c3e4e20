import { usualTest } from '../../shared/contracts/session-test.ts'
import { setTimeout as pause } from 'node:timers/promises'
import type { SessionSheet } from '../../shared/contracts/sessions.ts'
import type { Deps } from '../../server/deps.ts'
import { publish } from '../../server/modules/sessions/publish.service.ts'
import { create } from '../../server/modules/sessions/sessions.service.ts'
import { sheet } from '../../server/modules/sessions/sheet.service.ts'
import { change } from '../../server/modules/trials/trials.service.ts'
import { seededRandom } from '../synthetic/random.ts'
import { type DemoDay, demoDays, eveningOf } from './calendar.ts'
import { type DemoFile, dropFiles } from './drop-files.ts'
import { misnamed, oddFiles } from './odd-files.ts'
import type { SquadOnSite } from './people.ts'
import { isAway, mishapOf, type Recipe, recipeOf } from './stories.ts'
import type { FileStyle } from '../synthetic/file-styles.ts'

const trialsEach = 2
const lookEveryMs = 500

export type MakeFile = (recipe: Recipe, style: FileStyle) => Promise<Uint8Array>

/** All sessions of one squad, a month after the other, each published but the latest. */
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

/** The coach goes through the sheet: a trial whose jump itself failed a check is set aside, as a coach would. */
async function setAside(deps: Deps, { coach }: SquadOnSite, { trials }: SessionSheet): Promise<void> {
  for (const { id, version, analysis } of trials) {
    if (!analysis?.withheld.includes('jumpHeightImpulse')) continue
    const setAsideReason = `Repeated: ${analysis.worstSentence ?? 'the check failed'}`.slice(0, 280)
    await change(deps, coach, id, { version, setAsideReason })
  }
}
