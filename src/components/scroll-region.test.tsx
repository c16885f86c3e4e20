import { fireEvent, render, screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { ScrollRegion } from './scroll-region.tsx'

/** A region that shows 300 of 1,000 pixels, scrolled so far. */
function scrolledTo(scrollLeft: number): HTMLElement {
  render(<ScrollRegion label="Figures">wide</ScrollRegion>)
  const region = screen.getByRole('region', { name: 'Figures' })
  for (const [name, value] of Object.entries({ scrollWidth: 1000, clientWidth: 300, scrollLeft }))
    Object.defineProperty(region, name, { value })
  fireEvent.scroll(region)
  return region
}

describe('ScrollRegion', () => {
  test('says at its edge that more lies to the right, until its end is in sight', () => {
    expect(scrolledTo(0).parentElement).toHaveAttribute('data-more')
  })

  test('says nothing at its end, also where a width was rounded', () => {
    expect(scrolledTo(699.5).parentElement).not.toHaveAttribute('data-more')
  })

  test('is a stop of the Tab key, so that keys can scroll it', () => {
    expect(scrolledTo(0)).toHaveAttribute('tabindex', '0')
  })
})
