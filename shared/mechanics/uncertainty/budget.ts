import type { Figure } from '../types.ts'
import { studentT } from '../../statistics/distributions/student-t.ts'

/**
 * A value with what each input quantity contributes to its standard uncertainty: `parts[i]` is the sensitivity
 * to input i times the standard uncertainty of input i (GUM, JCGM 100:2008, 5.1), sign kept, so that two
 * quantities that share an input stay correlated through sums, products and quotients. Inputs beyond the end of
 * `parts` contribute nothing.
 */
export interface Quantity {
  readonly value: number
  readonly parts: Float64Array
}

/** An independent input quantity of the budget. */
interface Input {
  dof: number
  /** The same in every trial on these plates (calibration, gravity): left out of `URepeat`. */
  common: boolean
}

/** The uncertainty budget of one trial. Switched off, every quantity is exact and every U is `null`. */
export class Budget {
  readonly on: boolean
  private readonly inputs: Input[] = []
  private readonly nothing = new Float64Array(0)
  private readonly coverage: number
  /** Coverage factor where nothing is statistical. */
  private readonly normal: number

  constructor(on: boolean, coverage: number) {
    this.on = on
    this.coverage = coverage
    this.normal = studentT(coverage, Infinity)
  }

  exact(value: number): Quantity {
    return { value, parts: this.nothing }
  }

  /** A new independent input with standard uncertainty `u` in the unit of `value`. */
  input(value: number, u: number, dof = Infinity, common = false): Quantity {
    if (!this.on) return this.exact(value)
    const parts = new Float64Array(this.inputs.length + 1)
    parts[this.inputs.length] = u
    this.inputs.push({ dof, common })
    return { value, parts }
  }

  /** Σ coefficientᵢ · quantityᵢ in the parts, with the value as it was measured. */
  linear(value: number, terms: readonly (readonly [coefficient: number, quantity: Quantity])[]): Quantity {
    if (!this.on) return this.exact(value)
    let length = 0
    for (let t = 0; t < terms.length; t++) length = Math.max(length, terms[t][1].parts.length)
    const parts = new Float64Array(length)
    for (let t = 0; t < terms.length; t++) {
      const coefficient = terms[t][0]
      const from = terms[t][1].parts
      for (let i = 0; i < from.length; i++) parts[i] += coefficient * from[i]
    }
    return { value, parts }
  }

  /** The same for two quantities. */
  pair(value: number, ofA: number, a: Quantity, ofB: number, b: Quantity): Quantity {
    if (!this.on) return this.exact(value)
    const long = a.parts.length >= b.parts.length
    const [ofLonger, longer, ofShorter, shorter] = long
      ? [ofA, a.parts, ofB, b.parts]
      : [ofB, b.parts, ofA, a.parts]
    const parts = new Float64Array(longer.length)
    for (let i = 0; i < longer.length; i++) parts[i] = ofLonger * longer[i]
    for (let i = 0; i < shorter.length; i++) parts[i] += ofShorter * shorter[i]
    return { value, parts }
  }

  plus(a: Quantity, b: Quantity): Quantity {
    return this.pair(a.value + b.value, 1, a, 1, b)
  }

  minus(a: Quantity, b: Quantity): Quantity {
    return this.pair(a.value - b.value, 1, a, -1, b)
  }

  times(a: Quantity, b: Quantity): Quantity {
    return this.pair(a.value * b.value, b.value, a, a.value, b)
  }

  over(a: Quantity, b: Quantity): Quantity {
    const value = a.value / b.value
    return this.pair(value, 1 / b.value, a, -value / b.value, b)
  }

  scaled(a: Quantity, factor: number): Quantity {
    if (!this.on) return this.exact(a.value * factor)
    return { value: a.value * factor, parts: a.parts.map((part) => factor * part) }
  }

  /** Combined standard uncertainty, and the effective degrees of freedom (Welch–Satterthwaite, GUM G.4.1). */
  combined(quantity: Quantity, repeat = false): { u: number; dof: number } {
    let variance = 0
    let weighted = 0
    for (let i = 0; i < quantity.parts.length; i++) {
      const input = this.inputs[i]
      if (repeat && input.common) continue
      const square = quantity.parts[i] * quantity.parts[i]
      variance += square
      weighted += (square * square) / input.dof
    }
    return { u: Math.sqrt(variance), dof: weighted > 0 ? (variance * variance) / weighted : Infinity }
  }

  /** The figure as it leaves the engine. `withoutU` where no honest uncertainty can be given. */
  figure(quantity: Quantity, withoutU = false): Figure {
    if (!this.on)
      return { value: quantity.value, U: null, k: this.normal, URepeat: null, kRepeat: this.normal }
    const all = this.combined(quantity)
    const repeat = this.combined(quantity, true)
    const k = studentT(this.coverage, all.dof)
    const kRepeat = studentT(this.coverage, repeat.dof)
    const none = withoutU || !Number.isFinite(all.u)
    return {
      value: quantity.value,
      U: none ? null : k * all.u,
      k,
      URepeat: none ? null : kRepeat * repeat.u,
      kRepeat,
    }
  }
}
