/** Something the person at the terminal can mend: shown as its one sentence, without a stack. */
export class SetUpProblem extends Error {}

/**
 * Says what is being done, one line a step.
 * @param {string} text
 */
export function step(text) {
  console.log(`• ${text}`)
}

/**
 * Ends the process with the sentence of a problem, or the whole of an error nobody foresaw.
 * @param {unknown} error
 */
export function endWith(error) {
  console.error(error instanceof SetUpProblem ? `✗ ${error.message}` : error)
  process.exit(1)
}
