import { screen, waitFor, within } from '@testing-library/react'
import { http, HttpResponse } from 'msw'
import { describe, expect, test } from 'vitest'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { getSession, publishSession } from '../../shared/contracts/sessions.ts'
import { changeTrial } from '../../shared/contracts/trials.ts'
import { changeUpload, finishUpload, startUpload } from '../../shared/contracts/uploads.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, neverAnswers, refuse } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { aSession, aSheet, aSheetTrial, anUpload } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'
import { openSheet, serveSheet, sheetAddress } from '../../tests/setup/session-sheet.tsx'

const mara = idOf('athlete', 1)
const tomas = idOf('athlete', 2)

describe('the Session sheet', () => {
  test('shows every athlete, also those without a trial, and each trial with its height and uncertainty', async () => {
    await openSheet()
    const row = screen.getByRole('row', { name: /Mara Ostrow/ })
    expect(within(row).getByRole('link', { name: /Mara Ostrow, trial 1, 33\.5 ±\s0\.5 cm/ })).toBeVisible()
    expect(within(row).getByText('34.0')).toBeVisible()
    expect(screen.getByRole('row', { name: /Tomas Brandvold no trial yet/ })).toBeVisible()
    expect(screen.getByText('2 trials, 0 set aside')).toBeVisible()
    expect(screen.getByText(/A measurement, not a diagnosis/)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('has the columns of its test, and cells with the figure that stands for it', async () => {
    const dropJump = { ...usualTest('dj'), boxHeightM: 0.3 }
    const trial = aSheetTrial(1, 0.3, { athleteId: mara, test: dropJump })
    const metrics = { ...trial.analysis!.metrics, rsi: { value: 1.42, U: 0.03 } }
    const sheet = aSheet({ trials: [{ ...trial, analysis: { ...trial.analysis!, metrics } }] })
    await openSheet({ ...sheet, session: { ...sheet.session, test: dropJump } })
    expect(screen.getByText(/Drop jump, hands on hips, 30 cm box/)).toBeVisible()
    expect(screen.getAllByRole('columnheader').map(({ textContent }) => textContent)).toEqual([
      'Athlete',
      'Body mass, kg',
      expect.stringMatching(/^Mean RSI/),
      expect.stringMatching(/^Mean contact time/),
      'Mean jump height, cm',
      'Mean landing peak force, BW',
      'Trial 1',
    ])
    expect(screen.getByRole('link', { name: /Mara Ostrow, trial 1, 1\.42 ±\s0\.03/ })).toBeVisible()
  })

  test('says in words what is wrong with a trial, and strikes a withheld height', async () => {
    const trial = aSheetTrial(1, 0.335, { athleteId: mara })
    const analysis = {
      ...trial.analysis!,
      withheld: ['jumpHeightImpulse'],
      fails: 1,
      cautions: 2,
      worstSentence: 'The athlete moved.',
    }
    await openSheet(aSheet({ trials: [{ ...trial, analysis }] }))
    expect(
      screen.getByRole('link', {
        name: /trial 1, withheld 33\.5.*1 failed, 2 to look at, The athlete moved\./,
      }),
    ).toBeVisible()
  })

  test('arrow keys move among trials and Enter opens one', async () => {
    const { user, address: at } = await openSheet()
    screen.getByRole('link', { name: /Mara Ostrow, trial 1/ }).focus()
    await user.keyboard('{ArrowRight}')
    expect(screen.getByRole('link', { name: /Mara Ostrow, trial 2/ })).toHaveFocus()
    server.use(neverAnswers({ method: 'GET', path: '/api/trials/:trialId' }))
    await user.keyboard('{Enter}')
    await waitFor(() => expect(at()).toBe(`/trials/${idOf('trial', 2)}`))
  })

  test('x sets the trial aside with a reason; sheet and list are fresh, and it can be undone', async () => {
    const { user, kept } = await openSheet()
    screen.getByRole('link', { name: /Mara Ostrow, trial 1/ }).focus()
    await user.keyboard('x')
    const dialog = screen.getByRole('dialog', { name: 'Set aside trial 1 of Mara Ostrow' })
    expect(within(dialog).getByRole('button', { name: 'Moved while being weighed' })).toHaveFocus()
    await user.click(within(dialog).getByRole('button', { name: 'Set aside' }))
    expect(within(dialog).getByLabelText('Reason')).toHaveAccessibleDescription('Say why')
    expect(within(dialog).getByLabelText('Reason')).toHaveFocus()
    await user.click(within(dialog).getByRole('button', { name: 'Stepped off on landing' }))
    await user.click(within(dialog).getByRole('button', { name: 'Set aside' }))
    expect(
      await screen.findByRole('link', { name: /trial 1, set aside: Stepped off on landing/ }),
    ).toBeVisible()
    expect(screen.getByText('2 trials, 1 set aside')).toBeVisible()
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    expect(screen.getByRole('link', { name: /trial 1, set aside/ })).toHaveFocus()
    await user.click(screen.getByRole('button', { name: 'Undo' }))
    expect(await screen.findByRole('link', { name: /Mara Ostrow, trial 1, 33\.5/ })).toBeVisible()
    expect(kept.sheet.trials[0]!.setAside).toBeNull()
  })

  test('a trial that somebody changed meanwhile is not overwritten, and the newer state is shown', async () => {
    const { user, kept } = await openSheet()
    server.use(refuse(changeTrial, 'stale-version', 409, 'Somebody else changed this trial.'))
    screen.getByRole('link', { name: /Mara Ostrow, trial 1/ }).focus()
    await user.keyboard('x')
    await user.type(screen.getByLabelText('Reason'), 'Practice')
    const reads = kept.reads
    await user.click(within(screen.getByRole('dialog')).getByRole('button', { name: 'Set aside' }))
    expect(await screen.findByRole('alert')).toHaveTextContent('Somebody changed this while you had it open')
    expect(screen.getByLabelText('Reason')).toHaveValue('Practice')
    expect(kept.reads).toBeGreaterThan(reads)
  })

  test('m moves a trial to another athlete', async () => {
    const { user } = await openSheet()
    screen.getByRole('link', { name: /Mara Ostrow, trial 2/ }).focus()
    await user.keyboard('m')
    await user.selectOptions(screen.getByLabelText('Athlete'), 'Tomas Brandvold')
    await user.click(screen.getByRole('button', { name: 'Move' }))
    expect(await screen.findByRole('link', { name: /Tomas Brandvold, trial 1, 34\.5/ })).toBeVisible()
    expect(screen.getByText('Moved to Tomas Brandvold: trial 2 of Mara Ostrow.')).toBeVisible()
  })

  test('a trial in the Tray says what was measured and is put on an athlete; the list counts it no more', async () => {
    const { user, kept, router } = await openSheet(aSheet({ trials: [aSheetTrial(7, 0.3)] }))
    const tray = screen.getByRole('region', { name: 'Tray' })
    expect(tray).toHaveTextContent('1 trial without an athlete')
    expect(tray).toHaveTextContent('74.2 ± 0.3 kg, 30.0 ± 0.5 cm')
    await user.selectOptions(screen.getByLabelText('Athlete of plate_7.csv'), 'Tomas Brandvold')
    await user.click(screen.getByRole('button', { name: 'Assign plate_7.csv to this athlete' }))
    expect(await screen.findByRole('link', { name: /Tomas Brandvold, trial 1/ })).toBeVisible()
    expect(kept.sheet.trials[0]!.athleteId).toBe(tomas)
    expect(screen.getByText('empty: nothing waits for you')).toBeVisible()
    await router.navigate('/sessions')
    await pageTitled('Sessions')
    expect(await screen.findByRole('link', { name: 'November jumps' })).toBeVisible()
    expect(screen.queryByText('1 in the Tray')).not.toBeInTheDocument()
  })

  test('after an assignment the focus is on the choice of the next trial in the Tray', async () => {
    const { user } = await openSheet(aSheet({ trials: [aSheetTrial(7, 0.3), aSheetTrial(8, 0.31)] }))
    await user.selectOptions(screen.getByLabelText('Athlete of plate_7.csv'), 'Tomas Brandvold')
    await user.click(screen.getByRole('button', { name: /Assign plate_7/ }))
    await screen.findByRole('link', { name: /Tomas Brandvold, trial 1/ })
    expect(screen.getByLabelText('Athlete of plate_8.csv')).toHaveFocus()
  })

  test('the Tray says what was found in a file and what to do, where a duplicate is, and what is not all here', async () => {
    await openSheet(
      aSheet({
        uploads: [
          anUpload(1, {
            fileName: 'photo.png',
            state: 'refused',
            trials: 0,
            error: { code: 'not-a-recording', sentence: 'The file is a picture.', remedy: 'Export text.' },
          }),
          anUpload(2, {
            fileName: 'again.csv',
            state: 'duplicate',
            trials: 0,
            duplicateOf: {
              uploadId: idOf('upload', 9),
              sessionId: idOf('session', 9),
              fileName: 'first.csv',
            },
          }),
          anUpload(3, {
            fileName: 'cut.csv',
            state: 'receiving',
            trials: 0,
            sizeBytes: 2_500_000,
            chunksReceived: [0, 1],
            lastReceivedAt: '2026-11-12T10:04:00.000Z',
          }),
          anUpload(4, { fileName: 'slow.csv', state: 'waiting', trials: 0 }),
        ],
      }),
    )
    const tray = screen.getByRole('region', { name: 'Tray' })
    expect(tray).toHaveTextContent('The file is a picture. Export text.')
    expect(within(tray).getByRole('link', { name: 'Open the session that has it' })).toHaveAttribute(
      'href',
      `/sessions/${idOf('session', 9)}`,
    )
    expect(tray).toHaveTextContent(
      'Stopped at 83 %, 12 Nov 2026, 10:04; sent by Ines Calloway. Add the same file again to send the rest.',
    )
    expect(within(tray).getByText('2 of 4 files read')).toBeVisible()
    expect(within(tray).getByRole('link', { name: 'Download the original of photo.png' })).toHaveAttribute(
      'href',
      `/api/uploads/${idOf('upload', 1)}/original`,
    )
    await expectNoAxeFaults()
  })

  test('a file that becomes no trial is dismissed, stays to be found, and can be taken back', async () => {
    const refused = anUpload(1, {
      fileName: 'photo.png',
      state: 'refused',
      trials: 0,
      error: { code: 'not-a-recording', sentence: 'The file is a picture.', remedy: 'Export text.' },
    })
    const { user, kept } = await openSheet(aSheet({ trials: [], uploads: [refused] }))
    server.use(
      answer(changeUpload, ({ params, body }) => {
        expect(params.uploadId).toBe(refused.id)
        const before = kept.sheet.uploads[0]!
        expect(body.version).toBe(before.version)
        const dismissed = body.dismissed ? { at: '2026-11-12T10:09:00.000Z', byName: 'Ines Calloway' } : null
        const upload = { ...before, dismissed, version: before.version + 1 }
        kept.sheet = { ...kept.sheet, uploads: [upload] }
        return upload
      }),
    )
    const tray = screen.getByRole('region', { name: 'Tray' })
    await user.click(within(tray).getByRole('button', { name: 'Dismiss photo.png' }))
    expect(await screen.findByText('Dismissed: photo.png. The file is kept.')).toBeVisible()
    expect(within(tray).getByText('empty: nothing waits for you')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Undo' }))
    await user.click(await within(tray).findByRole('button', { name: 'Dismiss photo.png' }))
    await user.click(await within(tray).findByText('Show 1 dismissed file'))
    const list = within(tray).getByRole('list', { name: 'Dismissed files' })
    expect(list).toHaveTextContent('dismissed 12 Nov 2026, 10:09 by Ines Calloway')
    expect(within(list).getByRole('link', { name: 'Download the original of photo.png' })).toBeVisible()
    await expectNoAxeFaults()
    await user.click(within(list).getByRole('button', { name: 'Take back photo.png' }))
    expect(await within(tray).findByText('The file is a picture.', { exact: false })).toBeVisible()
    expect(within(tray).queryByRole('list', { name: 'Dismissed files' })).not.toBeInTheDocument()
  })

  test('a file that a colleague is sending is named, and asks nothing of anybody', async () => {
    const upload = anUpload(1, {
      fileName: 'long.csv',
      state: 'receiving',
      trials: 0,
      sizeBytes: 4 * 1024 * 1024,
      chunksReceived: [0],
      arriving: true,
      uploadedByName: 'Tove Lindgard',
    })
    await openSheet(aSheet({ trials: [], uploads: [upload] }))
    const tray = screen.getByRole('region', { name: 'Tray' })
    expect(tray).toHaveTextContent('long.csv Tove Lindgard is sending it now, 25 % here')
    expect(within(tray).getByText('empty: nothing waits for you')).toBeVisible()
    expect(within(tray).queryByRole('button', { name: /Dismiss/ })).not.toBeInTheDocument()
  })

  test('files go up and come out on the sheet; one over 64 MiB is refused by itself with the reader’s sentence', async () => {
    const { user, kept } = await openSheet(aSheet({ trials: [], uploads: [] }))
    const sent: string[] = []
    server.use(
      answer(startUpload, ({ body }) => {
        sent.push(body.fileName)
        const upload = anUpload(sent.length, { fileName: body.fileName, state: 'receiving', trials: 0 })
        kept.sheet = { ...kept.sheet, uploads: [...kept.sheet.uploads, upload] }
        return upload
      }),
      http.put('*/api/uploads/:uploadId/chunks/:n', ({ params }) =>
        HttpResponse.json({ n: Number(params.n) }),
      ),
      answer(finishUpload, ({ params }) => {
        const uploads = kept.sheet.uploads.map((upload) =>
          upload.id === params.uploadId ? { ...upload, state: 'read' as const, trials: 1 } : upload,
        )
        kept.sheet = { ...kept.sheet, uploads, trials: [aSheetTrial(1, 0.31, { athleteId: tomas })] }
        return uploads.find((upload) => upload.id === params.uploadId)!
      }),
    )
    const big = new File([], 'big.csv')
    Object.defineProperty(big, 'size', { value: 65 * 1024 * 1024 })
    await user.upload(screen.getByLabelText('Recordings to add'), [
      new File(['1,2'], 'Tomas Brandvold.csv'),
      big,
    ])
    expect(await screen.findByRole('link', { name: /Tomas Brandvold, trial 1/ })).toBeVisible()
    expect(sent).toEqual(['Tomas Brandvold.csv'])
    const list = screen.getByRole('list', { name: 'Files on their way' })
    expect(list).toHaveTextContent('The file has 65 MiB, and 64 MiB is the most that is read.')
    await user.click(within(list).getByRole('button', { name: 'Dismiss big.csv' }))
    expect(screen.queryByText(/65 MiB/)).not.toBeInTheDocument()
  })

  test('publishing spells out what athletes will see and what stays out; sheet and list say it is published', async () => {
    const { user, kept, router } = await openSheet(
      aSheet({
        trials: [
          aSheetTrial(1, 0.33, { athleteId: mara }),
          aSheetTrial(2, 0.34, {
            athleteId: mara,
            setAside: { reason: 'Practice', byName: 'Ines Calloway' },
          }),
          aSheetTrial(3, 0.3),
        ],
      }),
    )
    server.use(
      answer(publishSession, ({ body }) => {
        expect(body.version).toBe(1)
        const published = { publishedAt: '2026-11-12T17:00:00.000Z', version: 2 }
        kept.sheet = {
          ...kept.sheet,
          session: { ...kept.sheet.session, ...published, publishedByName: 'Ines Calloway' },
        }
        return { ...aSession(published), athletesPublished: 1, trialsPublished: 1 }
      }),
    )
    await user.click(screen.getByRole('button', { name: 'Publish to 1 athlete' }))
    const dialog = screen.getByRole('dialog', { name: 'Publish to 1 athlete?' })
    expect(dialog).toHaveTextContent('Stays out: 1 trial set aside, 1 trial in the Tray.')
    await user.click(within(dialog).getByRole('button', { name: 'Publish' }))
    const line = await screen.findByText(/Published 12 Nov 2026, 17:00 by Ines Calloway/)
    await waitFor(() => expect(line).toHaveFocus())
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    expect(screen.queryByRole('button', { name: /^Publish/ })).not.toBeInTheDocument()
    await router.navigate('/sessions')
    expect(await screen.findByRole('cell', { name: /published/ })).not.toHaveTextContent('not published')
  })

  test('a sheet changed since it was published offers to publish again', async () => {
    await openSheet(
      aSheet({
        session: {
          ...aSession({ publishedAt: '2026-11-12T17:00:00.000Z' }),
          note: null,
          squadIds: [],
          publishedByName: null,
        },
        changedSincePublished: true,
      }),
    )
    expect(screen.getByRole('button', { name: 'Publish again to 1 athlete' })).toBeVisible()
    expect(screen.getByText(/What athletes read is older than this sheet/)).toBeVisible()
  })

  test('an empty session says how recordings come in, and has nothing to publish', async () => {
    await openSheet(aSheet({ trials: [], uploads: [] }))
    expect(screen.getByText('no recordings yet')).toBeVisible()
    expect(screen.getByRole('button', { name: 'Publish' })).toBeDisabled()
  })

  test('a sheet that could not be read says so and can be asked for again', async () => {
    server.use(refuse(getSession, 'internal', 500, 'The sheet could not be read.'))
    const { user } = renderApp(sheetAddress, aMe(['coach']))
    await screen.findByText('The sheet could not be read.')
    serveSheet(aSheet())
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await pageTitled('November jumps')
  })

  test('an athlete may not open a sheet', async () => {
    renderApp(sheetAddress, aMe(['athlete']))
    await pageTitled('Your role does not allow this')
  })
})
