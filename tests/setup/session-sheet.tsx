import { changeTrial } from '../../shared/contracts/trials.ts'
import { getSession, listSessions, type SessionSheet } from '../../shared/contracts/sessions.ts'
import { listSquads } from '../../shared/contracts/squads.ts'
import { answer } from './msw/answer.ts'
import { idOf } from './msw/ids.ts'
import { aMe } from './msw/me.ts'
import { aSheet, aTrial, measuredJump } from './msw/measured.ts'
import { server } from './msw/server.ts'
import { pageTitled, renderApp } from './render-app.tsx'

export const sheetAddress = `/sessions/${idOf('session', 1)}`
const jump = measuredJump()

/** A server that keeps one sheet and changes it as the real one would. */
export function serveSheet(sheet: SessionSheet) {
  const kept = { sheet, reads: 0, listReads: 0 }
  const changeOne = (id: string, change: Partial<SessionSheet['trials'][number]>) => {
    kept.sheet = {
      ...kept.sheet,
      trials: kept.sheet.trials.map((trial) =>
        trial.id === id ? { ...trial, ...change, version: trial.version + 1 } : trial,
      ),
    }
  }
  server.use(
    answer(getSession, () => {
      kept.reads++
      return kept.sheet
    }),
    answer(listSquads, () => ({ squads: [] })),
    answer(listSessions, () => {
      kept.listReads++
      const { note: _note, squadIds: _squads, publishedByName: _by, ...session } = kept.sheet.session
      const inTray = kept.sheet.trials.filter((trial) => trial.athleteId === null).length
      return { sessions: [{ ...session, inTray }], page: 1, pages: 1, total: 1 }
    }),
    answer(changeTrial, ({ params, body }) => {
      const before = kept.sheet.trials.find((trial) => trial.id === params.trialId)!
      const setAside = body.setAsideReason ? { reason: body.setAsideReason, byName: 'Ines Calloway' } : null
      const athleteId = body.athleteId === undefined ? before.athleteId : body.athleteId
      changeOne(params.trialId, { athleteId, ...(body.setAsideReason === undefined ? {} : { setAside }) })
      const name = kept.sheet.athletes.find((athlete) => athlete.athleteId === athleteId)?.name
      return aTrial(jump, {
        id: params.trialId,
        athlete: athleteId && name ? { id: athleteId, name } : null,
        setAside,
        version: before.version + 1,
      })
    }),
  )
  return kept
}

/** A coach on the page of the sheet. */
export async function openSheet(sheet: SessionSheet = aSheet()) {
  const kept = serveSheet(sheet)
  const app = renderApp(sheetAddress, aMe(['coach']))
  await pageTitled('November jumps')
  return { ...app, kept }
}
