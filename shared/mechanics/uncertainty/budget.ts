import type { Figure } from '../types.ts'
import { studentT } from '../../statistics/distributions/student-t.ts'

/**
 * A value with what the input quantities contribute to its standard uncertainty: `parts[j]` is the sensitivity to
 * input `inputs[j]` times the standard uncertainty of that input (GUM, JCGM 100:2008, 5.1), sign kept, so that two
 * quantities that share an input stay correlated through sums, products and quotients. Inputs that are not named
 * contribute nothing.
 */
export interface Quantity {
  readonly value: number
  readonly inputs: readonly number[]
  readonly parts: readonly number[]
}

const noParts: readonly number[] = []

/** Sums of the parts by input while a quantity is put together; zero again after each. */
let sums = new Float64Array(256)
/** The inputs met so far, each once. */
const met: number[] = []

function scatter(coefficient: number, { inputs, parts }: Quantity): void {
  for (let j = 0; j < inputs.length; j++) {
    const i = inputs[j]
    // A part that cancelled to zero may be met twice; its second gathering finds nothing and adds nothing.
    if (sums[i] === 0) met.push(i)
    sums[i] += coefficient * parts[j]
  }
}

function gather(value: number): Quantity {
  const inputs: number[] = []
  const parts: number[] = []
  for (let j = 0; j < met.length; j++) {
    const i = met[j]
    const part = sums[i]
    if (part === 0) continue
    inputs.push(i)
    parts.push(part)
    sums[i] = 0
  }
  met.length = 0
  return { value, inputs, parts }
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
  private readonly coverage: number
  /** Coverage factor where nothing is statistical. */
  private readonly normal: number

  constructor(on: boolean, coverage: number) {
    this.on = on
    this.coverage = coverage
    this.normal = studentT(coverage, Infinity)
  }

  exact(value: number): Quantity {
    return { value, inputs: noParts, parts: noParts }
  }

  /** A new independent input with standard uncertainty `u` in the unit of `value`. */
  input(value: number, u: number, dof = Infinity, common = false): Quantity {
    if (!this.on) return this.exact(value)
    const index = this.inputs.push({ dof, common }) - 1
    if (index >= sums.length) sums = new Float64Array(2 * sums.length)
    return { value, inputs: [index], parts: [u] }
  }

  /** Σ coefficientᵢ · quantityᵢ in the parts, with the value as it was measured. */
  linear(value: number, terms: readonly (readonly [coefficient: number, quantity: Quantity])[]): Quantity {
    if (!this.on) return this.exact(value)
    for (let t = 0; t < terms.length; t++) scatter(terms[t][0], terms[t][1])
    return gather(value)
  }

  /** The same for two quantities. */
  pair(value: number, ofA: number, a: Quantity, ofB: number, b: Quantity): Quantity {
    if (!this.on) return this.exact(value)
    scatter(ofA, a)
    scatter(ofB, b)
    return gather(value)
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
    return { value: a.value * factor, inputs: a.inputs, parts: a.parts.map((part) => factor * part) }
  }

  /** Combined standard uncertainty, and the effective degrees of freedom (Welch–Satterthwaite, GUM G.4.1). */
  combined({ inputs, parts }: Quantity, repeat = false): { u: number; dof: number } {
    let variance = 0
    let weighted = 0
    for (let j = 0; j < inputs.length; j++) {
      const input = this.inputs[inputs[j]]
      if (repeat && input.common) continue
      const square = parts[j] * parts[j]
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
