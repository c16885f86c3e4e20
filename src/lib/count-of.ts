import { counted } from './counted.ts'

/** How much of a list is shown: "12 athletes", or "3 of 12 athletes". */
export function countOf(shown: number, all: number, noun: string): string {
  return shown === all ? counted(all, noun) : `${shown} of ${counted(all, noun)}`
}
