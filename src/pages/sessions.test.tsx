import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { changeSession, createSession, getSession, listSessions } from '../../shared/contracts/sessions.ts'
import { listSquads } from '../../shared/contracts/squads.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { aSquad } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { aSession, aSheet } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const squads = [
  aSquad(1, { name: 'Senior squad', athleteIds: [idOf('athlete', 1)] }),
  aSquad(2, { name: 'Old', archived: true }),
]

/** A server with these sessions, twenty a page. */
function serve(titles: string[]) {
  const asked: unknown[] = []
  const kept = { sessions: titles.map((title, i) => aSession({ id: idOf('session', i + 1), title })) }
  server.use(
    answer(listSquads, () => ({ squads })),
    answer(listSessions, ({ query }) => {
      asked.push(query)
      const found = kept.sessions.filter(({ title }) => title.includes(query.search ?? ''))
      const pages = Math.max(1, Math.ceil(found.length / 20))
      const sessions = found.slice((query.page - 1) * 20, query.page * 20)
      return { sessions, page: query.page, pages, total: found.length }
    }),
  )
  return { asked, kept }
}

describe('the list of sessions', () => {
  test('shows each with its trials, what waits in the Tray and whether it is published', async () => {
    const { kept } = serve(['November jumps', 'October jumps'])
    kept.sessions[0] = { ...kept.sessions[0]!, inTray: 2 }
    kept.sessions[1] = { ...kept.sessions[1]!, publishedAt: '2026-10-12T17:00:00.000Z' }
    renderApp('/sessions', aMe(['coach']))
    const first = await screen.findByRole('row', { name: /November jumps/ })
    expect(first).toHaveTextContent('2 in the Tray')
    expect(first).toHaveTextContent('not published')
    expect(screen.getByRole('row', { name: /October jumps/ })).not.toHaveTextContent('not published')
    await expectNoAxeFaults()
  })

  test('search, squad and page are held in the address and asked of the server', async () => {
    const { asked } = serve(Array.from({ length: 25 }, (_, i) => `Jumps ${i + 1}`))
    const { user, address } = renderApp('/sessions', aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Older' }))
    expect(await screen.findByText('Page 2 of 2')).toBeVisible()
    expect(address()).toBe('/sessions?page=2')
    await user.selectOptions(screen.getByLabelText('Squad'), 'Senior squad')
    await user.type(screen.getByLabelText('Search title or place'), 'Jumps 25')
    await waitFor(() => expect(screen.getAllByRole('row')).toHaveLength(2))
    expect(address()).toBe(`/sessions?squad=${idOf('squad', 1)}&search=Jumps+25`)
    expect(asked.at(-1)).toEqual({ search: 'Jumps 25', squadId: idOf('squad', 1), page: 1 })
  })

  test('a search that finds nothing says so and offers all of them again', async () => {
    serve(['November jumps'])
    const { user } = renderApp('/sessions?search=ski', aMe(['coach']))
    expect(await screen.findByText('No session matches')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Show all sessions' }))
    expect(await screen.findByRole('link', { name: 'November jumps' })).toBeVisible()
  })

  test('a club without sessions is told what to do first', async () => {
    serve([])
    renderApp('/sessions', aMe(['coach']))
    expect(await screen.findByText('No sessions yet')).toBeVisible()
    await expectNoAxeFaults()
  })

  test('a failure offers a retry', async () => {
    serve(['November jumps'])
    server.use(refuse(listSessions, 'internal', 500, 'The list could not be read.'))
    renderApp('/sessions', aMe(['coach']))
    expect(await screen.findByText('The list could not be read.')).toBeVisible()
    expect(screen.getByRole('button', { name: 'Try again' })).toBeVisible()
  })
})

describe('a new session', () => {
  test('is made for the squads chosen and opens as its sheet; the list has it', async () => {
    const { kept } = serve([])
    server.use(
      answer(createSession, ({ body }) => {
        expect(body).toMatchObject({
          title: 'November jumps',
          place: null,
          note: null,
          test: { protocol: 'cmj', side: 'both', externalLoadKg: 20, boxHeightM: null, arms: 'free' },
          squadIds: [idOf('squad', 1)],
        })
        kept.sessions = [aSession({ title: body.title, date: body.date })]
        return kept.sessions[0]!
      }),
      answer(getSession, () => aSheet({ trials: [], uploads: [] })),
    )
    const { user, address, router } = renderApp('/sessions', aMe(['coach']))
    await screen.findByText('No sessions yet')
    await router.navigate('/sessions/new')
    await pageTitled('New session')
    expect(screen.queryByLabelText('Old')).not.toBeInTheDocument()
    await user.click(await screen.findByRole('button', { name: 'Make the session' }))
    expect(await screen.findByText('Give the session a title')).toBeVisible()
    expect(screen.getByText('Choose at least one squad')).toBeVisible()
    await expectNoAxeFaults()
    await user.type(screen.getByLabelText('Title'), 'November jumps')
    await user.clear(screen.getByLabelText('Load carried, kg'))
    await user.type(screen.getByLabelText('Load carried, kg'), '500')
    await user.selectOptions(screen.getByLabelText('Arms'), 'arms free')
    expect(screen.queryByLabelText('Side')).not.toBeInTheDocument()
    expect(screen.queryByLabelText(/^Box/)).not.toBeInTheDocument()
    expect(await screen.findByText('Give a load of 0 to 300 kg')).toBeVisible()
    await user.clear(screen.getByLabelText('Load carried, kg'))
    await user.type(screen.getByLabelText('Load carried, kg'), '20')
    await user.click(screen.getByLabelText('Senior squad'))
    await user.click(screen.getByRole('button', { name: 'Make the session' }))
    await pageTitled('November jumps')
    expect(address()).toBe(`/sessions/${idOf('session', 1)}`)
    await router.navigate('/sessions')
    expect(await screen.findByRole('link', { name: 'November jumps' })).toBeVisible()
  })

  test('asks of each test what it needs, and for nothing that it does not have', async () => {
    serve([])
    const made: unknown[] = []
    server.use(
      answer(createSession, ({ body }) => {
        made.push(body.test)
        return aSession()
      }),
      answer(getSession, () => aSheet({ trials: [], uploads: [] })),
    )
    const { user } = renderApp('/sessions/new', aMe(['coach']))
    await user.type(await screen.findByLabelText('Title'), 'Drops')
    await user.click(screen.getByLabelText('Senior squad'))
    await user.type(screen.getByLabelText('Load carried, kg'), '20')
    await user.selectOptions(screen.getByLabelText('Test'), 'Drop landing')
    for (const label of ['Load carried, kg', 'Arms'])
      expect(screen.queryByLabelText(label)).not.toBeInTheDocument()
    await user.selectOptions(screen.getByLabelText('Side'), 'left leg')
    await user.click(screen.getByRole('button', { name: 'Make the session' }))
    expect(await screen.findByText('Give the height of the box')).toBeVisible()
    expect(screen.getByLabelText('Box, m')).toHaveFocus()
    await user.type(screen.getByLabelText('Box, m'), '0,3')
    await user.click(screen.getByRole('button', { name: 'Make the session' }))
    await waitFor(() =>
      expect(made).toEqual([
        { protocol: 'dropLanding', side: 'left', externalLoadKg: 0, boxHeightM: 0.3, arms: 'hips' },
      ]),
    )
  })

  test('what the server refuses stands at the form, and what was typed stays', async () => {
    serve([])
    server.use(
      refuse(createSession, 'invalid-request', 400, 'Some of it cannot be used.', {
        title: 'Too odd a title',
      }),
    )
    const { user } = renderApp('/sessions/new', aMe(['coach']))
    await user.type(await screen.findByLabelText('Title'), 'Odd')
    await user.click(screen.getByLabelText('Senior squad'))
    await user.click(screen.getByRole('button', { name: 'Make the session' }))
    expect(await screen.findByText('Too odd a title')).toBeVisible()
    expect(screen.getByLabelText('Title')).toHaveValue('Odd')
  })
})

describe('editing a session', () => {
  test('saves title, date, place and note; sheet and list are fresh', async () => {
    const { kept } = serve(['November jumps'])
    let sheet = aSheet()
    server.use(
      answer(getSession, () => sheet),
      answer(changeSession, ({ body: { version, ...change } }) => {
        expect(version).toBe(1)
        sheet = { ...sheet, session: { ...sheet.session, ...change, version: 2 } }
        kept.sessions = [aSession({ title: change.title, version: 2 })]
        return kept.sessions[0]!
      }),
    )
    const { user, router } = renderApp(`/sessions/${idOf('session', 1)}`, aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Edit' }))
    const dialog = screen.getByRole('dialog', { name: 'Edit the session' })
    await user.clear(await within(dialog).findByLabelText('Title'))
    await user.type(within(dialog).getByLabelText('Title'), 'Winter jumps')
    await user.click(within(dialog).getByRole('button', { name: 'Save' }))
    await pageTitled('Winter jumps')
    await router.navigate('/sessions')
    expect(await screen.findByRole('link', { name: 'Winter jumps' })).toBeVisible()
  })

  test('brings a squad in and takes one out, and says who leaves the sheet', async () => {
    serve(['November jumps'])
    const changed: unknown[] = []
    server.use(
      answer(listSquads, () => ({ squads: [...squads, aSquad(3, { name: 'Juniors' })] })),
      answer(getSession, () => aSheet()),
      answer(changeSession, ({ body }) => {
        changed.push(body.squadIds)
        return aSession({ version: 2 })
      }),
    )
    const { user } = renderApp(`/sessions/${idOf('session', 1)}`, aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Edit' }))
    const dialog = screen.getByRole('dialog', { name: 'Edit the session' })
    expect(await within(dialog).findByLabelText('Senior squad')).toBeChecked()
    expect(within(dialog).queryByLabelText(/^Old/)).not.toBeInTheDocument()
    expect(dialog).toHaveTextContent(
      'Athletes of a squad that you take out leave the sheet, unless they have trials on it.',
    )
    expect(dialog).toHaveTextContent('With another test the trials of this session are analysed anew.')
    await user.click(within(dialog).getByLabelText('Senior squad'))
    await user.click(within(dialog).getByRole('button', { name: 'Save' }))
    expect(await within(dialog).findByText('Choose at least one squad')).toBeVisible()
    await user.click(within(dialog).getByLabelText('Juniors'))
    await user.click(within(dialog).getByRole('button', { name: 'Save' }))
    await waitFor(() => expect(dialog).not.toBeInTheDocument())
    expect(changed).toEqual([[idOf('squad', 3)]])
  })

  test('keeps a squad that was archived since', async () => {
    serve(['November jumps'])
    const sheet = aSheet()
    server.use(
      answer(getSession, () => ({ ...sheet, session: { ...sheet.session, squadIds: [idOf('squad', 2)] } })),
    )
    const { user } = renderApp(`/sessions/${idOf('session', 1)}`, aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Edit' }))
    expect(await screen.findByLabelText('Old (archived)')).toBeChecked()
  })
})
