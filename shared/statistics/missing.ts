/** Why there is no figure. */
export type MissingReason =
  /** Fewer values than the method needs. */
  | 'too-few-values'
  /** A value is NaN or infinite, or the figure is beyond what a number holds. Nothing is left out silently. */
  | 'not-finite'
  /** All values are the same where the method divides by their spread. */
  | 'no-spread'
  /** The method takes logarithms or ratios, and a value is zero or negative. */
  | 'not-positive'
  /** Rows or columns that belong together have different lengths. */
  | 'unequal-lengths'
  /** A line is not steep enough, for how uncertain it is, to say where it meets a level. */
  | 'slope-not-clear'

/** Stands where a figure would: why there is none, and how many values would do. */
export interface Missing {
  missing: MissingReason
  found?: number
  needed?: number
}

export function isMissing(result: object): result is Missing {
  return 'missing' in result
}

/** The reason "too few", with what was found and what is needed. */
export function tooFew(found: number, needed: number): Missing {
  return { missing: 'too-few-values', found, needed }
}
