import { screen, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { getSeats } from '../../shared/contracts/clubs.ts'
import {
  changeSeatRule,
  getSeatPlan,
  giveSeat,
  releaseSeat,
  type SeatLine,
  type SeatPlan,
} from '../../shared/contracts/seats.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

const since = '2027-02-01T10:00:00.000Z'
const line = (n: number, name: string, state: SeatLine['state']): SeatLine => ({
  athleteId: idOf('athlete', n),
  name,
  state,
  since: state === 'none' ? null : since,
  freesAt: state === 'cooling' ? '2027-02-15T10:00:00.000Z' : null,
})

function openPage(change: Partial<SeatPlan> = {}) {
  const plan: SeatPlan = { paid: 3, used: 2, byItself: true, version: 0, athletes: [], ...change }
  const of = (athleteId: string) => plan.athletes.find((one) => one.athleteId === athleteId) as SeatLine
  server.use(
    answer(getSeats, () => ({ used: 2, paid: plan.paid, staff: 6 })),
    answer(getSeatPlan, () => plan),
    answer(giveSeat, ({ body }) => {
      Object.assign(of(body.athleteId), { state: 'waiting', since })
      return plan
    }),
    answer(releaseSeat, ({ body }) => {
      Object.assign(of(body.athleteId), { state: 'none', since: null })
      return plan
    }),
    answer(changeSeatRule, ({ body }) => Object.assign(plan, { byItself: body.byItself, version: 1 })),
  )
  return renderApp('/club/seats', aMe(['admin']))
}

describe('seats', () => {
  test('shows how many are used, free, cooling and not needed, and who has one, with no accessibility faults', async () => {
    openPage({ athletes: [line(1, 'Aino Berg', 'seated'), line(2, 'Ben Cole', 'cooling')] })
    expect(await screen.findByText('of 3 seats used')).toBeVisible()
    expect(screen.getByText('Seats free').nextElementSibling).toHaveTextContent('1')
    const ben = within(screen.getByRole('row', { name: /Ben Cole/ }))
    expect(ben.getByText('free on 15 Feb 2027, 10:00')).toBeVisible()
    await expectNoAxeFaults()
  })

  test('gives a seat or a place on the list, releases it, and says what came of it', async () => {
    const { user } = openPage({ athletes: [line(1, 'Aino Berg', 'seated'), line(2, 'Ben Cole', 'none')] })
    await user.click(await screen.findByRole('button', { name: 'Give a seat: Ben Cole' }))
    expect(await screen.findByText('Ben Cole waits for a seat.')).toBeInTheDocument()
    expect(await screen.findByText(/1 athlete waits for a seat/)).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Release the seat: Aino Berg' }))
    expect(
      await screen.findByText('Aino Berg has no seat any more. All results are kept.'),
    ).toBeInTheDocument()
  })

  test('finds by name and by seat', async () => {
    const { user, address } = openPage({
      athletes: [line(1, 'Aino Berg', 'seated'), line(2, 'Ben Cole', 'waiting')],
    })
    await user.selectOptions(await screen.findByRole('combobox', { name: 'Seat' }), 'waits for a seat')
    expect(screen.queryByRole('row', { name: /Aino/ })).not.toBeInTheDocument()
    expect(address()).toBe('/club/seats?seat=waiting')
  })

  test('says what follows where there are more athletes than seats', async () => {
    openPage({ paid: 1, athletes: [line(1, 'Aino Berg', 'seated'), line(2, 'Ben Cole', 'over')] })
    expect(await screen.findByText(/1 more athlete than there are seats/)).toBeVisible()
    expect(screen.getByText('Seats free').nextElementSibling).toHaveTextContent('0')
  })

  test('changes whether seats are given by themselves', async () => {
    const { user } = openPage()
    expect(await screen.findByText('No athletes yet')).toBeVisible()
    const rule = screen.getByRole('checkbox', { name: /Give a seat to whoever/ })
    await user.click(rule)
    await expect.poll(() => rule).not.toBeChecked()
  })

  test('a failed reading says what happened', async () => {
    openPage()
    server.use(refuse(getSeatPlan, 'internal', 500))
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side')
  })
})
