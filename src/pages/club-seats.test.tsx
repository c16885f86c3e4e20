import { screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { getSeats } from '../../shared/contracts/clubs.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

describe('seats', () => {
  test('shows how many are used, free and not needed, with no accessibility faults', async () => {
    server.use(answer(getSeats, () => ({ used: 45, paid: 60, staff: 6 })))
    renderApp('/club/seats', aMe(['admin']))
    expect(await screen.findByText('of 60 seats used')).toBeVisible()
    expect(screen.getByText('Seats free').nextElementSibling).toHaveTextContent('15')
    expect(screen.getByText('Staff, without a seat').nextElementSibling).toHaveTextContent('6')
    await expectNoAxeFaults()
  })

  test('more athletes than seats are said', async () => {
    server.use(answer(getSeats, () => ({ used: 62, paid: 60, staff: 6 })))
    renderApp('/club/seats', aMe(['admin']))
    expect(await screen.findByText('2 more active athletes than there are seats.')).toBeVisible()
    expect(screen.getByText('Seats free').nextElementSibling).toHaveTextContent('0')
  })

  test('a failed reading says what happened', async () => {
    server.use(refuse(getSeats, 'internal', 500))
    renderApp('/club/seats', aMe(['admin']))
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side')
  })
})
