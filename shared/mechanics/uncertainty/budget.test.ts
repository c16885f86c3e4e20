import { describe, expect, it } from 'vitest'
import { Budget } from './budget.ts'

describe('the uncertainty budget', () => {
  it('adds independent inputs in quadrature and dependent ones by sign', () => {
    const budget = new Budget(true, 0.95)
    const a = budget.input(10, 3)
    const b = budget.input(20, 4)
    expect(budget.combined(budget.plus(a, b)).u).toBeCloseTo(5, 12)
    expect(budget.combined(budget.minus(a, b)).u).toBeCloseTo(5, 12)
    expect(budget.combined(budget.plus(a, a)).u).toBeCloseTo(6, 12)
    expect(budget.combined(budget.minus(a, a)).u).toBe(0)
    expect(budget.combined(budget.times(a, b)).u).toBeCloseTo(Math.hypot(60, 40), 12)
    expect(budget.combined(budget.over(a, b)).u).toBeCloseTo(Math.hypot(3 / 20, (10 * 4) / 400), 12)
    expect(budget.over(budget.times(a, b), b).value).toBeCloseTo(10, 12)
    expect(budget.combined(budget.over(budget.times(a, b), b)).u).toBeCloseTo(3, 12)
    expect(budget.combined(budget.scaled(a, -2)).u).toBeCloseTo(6, 12)
  })

  it('gives the published example of takeoff velocity: u(v) 11.790 mm/s', () => {
    // Contributions in mm/s: weight −10.651262, gravity 0.132563, takeoff −4.903325, noise 0.707107, onset 1.
    const budget = new Budget(true, 0.95)
    const velocity = budget.linear(2.6, [
      [-0.0133140777, budget.input(784.532, 0.8)],
      [0.2651262154, budget.input(9.80665, 0.0005)],
      [-9.80665, budget.input(0, 0.0005)],
      [0.0125, budget.input(835.6256, 0.0565685)],
      [1, budget.input(0, 0.001)],
    ])
    expect(budget.combined(velocity).u).toBeCloseTo(0.01179023, 7)
  })

  it('counts degrees of freedom by Welch and Satterthwaite', () => {
    const budget = new Budget(true, 0.95)
    const few = budget.input(0, 1, 4)
    const many = budget.input(0, 1, 16)
    // (1 + 1)² / (1/4 + 1/16)
    expect(budget.combined(budget.plus(few, many)).dof).toBeCloseTo(12.8, 12)
    expect(budget.combined(budget.plus(few, budget.input(0, 1))).dof).toBeCloseTo(16, 12)
    expect(budget.figure(few).k).toBeCloseTo(2.7764, 3)
    expect(budget.figure(few).U).toBeCloseTo(2.7764, 3)
  })

  it('leaves common inputs out of URepeat', () => {
    const budget = new Budget(true, 0.95)
    const figure = budget.figure(budget.plus(budget.input(0, 3, Infinity, true), budget.input(0, 4)))
    expect(figure.U).toBeCloseTo(1.959964 * 5, 5)
    expect(figure.URepeat).toBeCloseTo(1.959964 * 4, 5)
  })

  it('gives no U where none is honest, where it is not finite, and where it is switched off', () => {
    const budget = new Budget(true, 0.95)
    expect(budget.figure(budget.input(1, 1), true)).toMatchObject({ value: 1, U: null, URepeat: null })
    expect(budget.figure(budget.input(1, NaN)).U).toBeNull()
    const off = new Budget(false, 0.95)
    expect(off.figure(off.plus(off.input(1, 1), off.input(2, 1)))).toMatchObject({ value: 3, U: null })
  })

  it('of an exact quantity is zero', () => {
    const budget = new Budget(true, 0.95)
    expect(budget.figure(budget.exact(4))).toMatchObject({ value: 4, U: 0, URepeat: 0 })
  })
})
