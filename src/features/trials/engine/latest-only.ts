/**
 * Asks one question at a time: while it is being answered only the newest of those that came is kept, and asked next.
 * An event dragged faster than the engine answers is thus never behind by more than one answer.
 */
export function latestOnly<Q, A>(
  ask: (question: Q) => Promise<A>,
  heard: { onAnswer: (answer: A, question: Q) => void; onFailure: (error: unknown) => void },
): (question: Q) => void {
  let busy = false
  let next: { question: Q } | null = null
  const run = async (question: Q) => {
    busy = true
    try {
      heard.onAnswer(await ask(question), question)
    } catch (error) {
      heard.onFailure(error)
    }
    busy = false
    const waiting = next
    next = null
    if (waiting) void run(waiting.question)
  }
  return (question) => {
    if (busy) next = { question }
    else void run(question)
  }
}
