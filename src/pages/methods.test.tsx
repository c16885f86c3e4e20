import { readFileSync } from 'node:fs'
import { screen, within } from '@testing-library/react'
import { http, HttpResponse } from 'msw'
import { beforeEach, describe, expect, test } from 'vitest'
import { metricKeys } from '../../shared/mechanics/catalogue.ts'
import { checkKeys } from '../../shared/mechanics/checks/check-definitions.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const sample = readFileSync('public/samples/two-plates.csv')
const region = (name: string | RegExp) => screen.getByRole('region', { name })

beforeEach(() => {
  server.use(
    http.get('*/samples/two-plates.csv', () => HttpResponse.arrayBuffer(new Uint8Array(sample).buffer)),
  )
})

describe('the Method notes', () => {
  test('are open to somebody who is not signed in, with the cautions', async () => {
    renderApp('/methods', null)
    await pageTitled('Methods')
    expect(screen.getByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in?from=%2Fmethods')
    expect(region('Cautions')).toHaveTextContent('No validated injury limit exists')
    const links = screen.getAllByRole('link').map((link) => link.getAttribute('href'))
    for (const key of [...metricKeys, ...checkKeys]) expect(links).toContain(`/methods/${key}`)
    await expectNoAxeFaults()
  })

  test('can be reached from the sign-in page', async () => {
    const { user } = renderApp('/sign-in', null)
    await pageTitled('Sign in')
    await user.click(screen.getByRole('link', { name: 'Methods' }))
    await pageTitled('Methods')
  })

  test('are found by name, and the address keeps the search', async () => {
    const { user, address } = renderApp('/methods', aMe(['athlete']))
    await pageTitled('Methods')
    await user.type(screen.getByRole('searchbox', { name: 'Search by name' }), 'takeoff vel')
    expect(await screen.findByText(/^1 of \d+ notes$/)).toBeVisible()
    expect(address()).toBe('/methods?search=takeoff+vel')
    await user.click(screen.getByRole('link', { name: 'Takeoff velocity' }))
    await pageTitled('Takeoff velocity')
  })

  test('a search that finds nothing leads back to all notes', async () => {
    const { user } = renderApp('/methods?search=zzz', null)
    await user.click(await screen.findByRole('button', { name: 'Show all notes' }))
    expect(screen.getByRole('link', { name: 'Jump height' })).toBeVisible()
  })
})

describe('the note of a metric', () => {
  test('says what it is, and works an example out from the sample recording', async () => {
    renderApp('/methods/jumpHeightImpulse', null)
    await pageTitled('Jump height')
    const math = region('Formula').querySelector('math')
    expect(math).toHaveTextContent('h=')
    expect(math!.outerHTML).not.toContain('style=')
    expect(await within(region('Worked example')).findByText(/invented recording/)).toBeVisible()
    expect(region('Worked example')).toHaveTextContent(/\d\d\.\d ± \d\.\d cm/)
    expect(screen.getByRole('slider', { name: 'Read the trace' })).toHaveAccessibleDescription(
      /From the velocity at takeoff\. In the sample: onset at .* s, takeoff at/,
    )
    expect(within(region(/^Settings in force/)).getByText('eventForceN')).toBeVisible()
    expect(within(region('At a glance')).getByRole('link', { name: 'Takeoff velocity' })).toHaveAttribute(
      'href',
      '/methods/takeoffVelocity',
    )
    await expectNoAxeFaults()
  })

  test('gives each foot where two plates tell them apart, with the caution', async () => {
    renderApp('/methods/stanceForce', null)
    await pageTitled('Force in quiet stance')
    expect(await screen.findByText('Right foot')).toBeVisible()
    expect(region('Limits')).toHaveTextContent('A measurement, not a diagnosis')
  })

  test('names the checks that can take it away, which lead to their notes', async () => {
    const { user } = renderApp('/methods/landingPeakForce', null)
    await pageTitled('Landing peak force')
    const checks = region('Checks that can take it away')
    expect(within(checks).queryByRole('link', { name: 'Zero' })).not.toBeInTheDocument()
    await user.click(within(checks).getByRole('link', { name: 'Landing on the plates' }))
    await pageTitled('Landing on the plates')
  })

  test('a sample that cannot be fetched can be asked for again, and the note stands', async () => {
    server.use(http.get('*/samples/two-plates.csv', () => HttpResponse.error()))
    renderApp('/methods/netImpulse', null)
    await pageTitled('Net impulse')
    expect(await screen.findAllByRole('button', { name: 'Try again' })).toHaveLength(2)
    expect(region('Definition')).toBeVisible()
  })

  test('an unknown key says so and leads to all notes', async () => {
    renderApp('/methods/nothing', null)
    await pageTitled('There is no such note')
    expect(screen.getByRole('link', { name: 'See all Method notes' })).toHaveAttribute('href', '/methods')
  })
})

describe('the note of a check', () => {
  test('says what is measured, what it affects and what to do', async () => {
    renderApp('/methods/zero-offset', aMe(['coach']))
    await pageTitled('Zero of the plates')
    expect(region('What to do')).toHaveTextContent('Set the plates to zero while nobody stands on them.')
    expect(await within(region('Worked example')).findByText('Verdict')).toBeVisible()
    expect(within(region(/^Settings in force/)).getByText('zeroOffsetFailN')).toBeVisible()
    await expectNoAxeFaults()
  })
})
