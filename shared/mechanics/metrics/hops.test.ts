import { describe, expect, it } from 'vitest'
import { defaultSettings } from '../settings.ts'
import { Budget } from '../uncertainty/budget.ts'
import { hopFigures, type Hop } from './hops.ts'
import type { Measured } from './measured.ts'

const g = 9.80665
const budget = new Budget(true, 0.95)
const model = { budget, settings: defaultSettings }

function hop(contactS: number, flightS: number, counted = contactS <= 0.25): Hop {
  const height = (g * flightS * flightS) / 8
  return {
    touchdown: budget.exact(0),
    takeoff: budget.exact(contactS),
    contactTime: budget.input(contactS, 0.001),
    flightTime: budget.exact(flightS),
    height: budget.exact(height),
    rsi: budget.input(height / contactS, 0.01),
    rsiFlightContact: budget.exact(flightS / contactS),
    peakForce: budget.exact(3000),
    counted,
  }
}

function figuresOf(hops: Hop[]) {
  const into: Measured = new Map()
  hopFigures(model, hops, into)
  const value = (key: 'hopCount' | 'rsiBestFive' | 'contactTimeMean') => {
    const outcome = into.get(key)
    return outcome && 'quantity' in outcome ? outcome.quantity : null
  }
  return { count: value('hopCount'), best: value('rsiBestFive'), mean: value('contactTimeMean') }
}

describe('the figures of a series of hops', () => {
  // Ten hops worked out by hand: RSI 0.9128 1.1648 1.2653 1.3560 1.4103 1.4618 1.5184 1.4650 1.5478 1.3886.
  const contacts = [0.26, 0.215, 0.205, 0.198, 0.192, 0.19, 0.186, 0.188, 0.184, 0.195]
  const flights = [0.44, 0.452, 0.46, 0.468, 0.47, 0.476, 0.48, 0.474, 0.482, 0.47]
  const hops = contacts.map((contactS, i) => hop(contactS, flights[i] ?? 0))

  it('are the mean of the best five of ten, and the mean contact of those that count', () => {
    const { count, best, mean } = figuresOf(hops)
    expect(count?.value).toBe(10)
    expect(best?.value).toBeCloseTo(1.48067, 5)
    const counted = contacts.slice(1)
    expect(mean?.value).toBeCloseTo(counted.reduce((sum, t) => sum + t, 0) / 9, 12)
  })

  it('are surer than one hop: five independent ones by the root of five', () => {
    expect(budget.combined(figuresOf(hops).best ?? budget.exact(0)).u).toBeCloseTo(0.01 / Math.sqrt(5), 12)
  })

  it('leave the score out where fewer than five count, and the mean where none does', () => {
    const four = [...hops.slice(1, 5), hop(0.3, 0.4)]
    expect(figuresOf(four).best).toBeNull()
    expect(figuresOf(four).mean?.value).toBeCloseTo((0.215 + 0.205 + 0.198 + 0.192) / 4, 12)
    expect(figuresOf([hop(0.3, 0.4)]).mean).toBeNull()
  })
})
