const dashes = ['7 3', '2 3', '9 3 2 3'] as const

/** As many trials as can be told apart by their dashes. */
export const mostOverlays = dashes.length

/** The dash of the trial that is laid over as the i-th, from 0. */
export const overlayDash = (i: number): string => dashes[i % dashes.length]!
