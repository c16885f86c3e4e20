import type { EngineQuestion } from '../../src/features/trials/engine/engine-tasks.ts'

const loadEngine = () => import('../../src/features/trials/engine/answer-questions.ts')

/**
 * jsdom has no workers: the engine answers from the same process instead, later and on copies, as a worker would.
 * It is loaded only by a test that asks something of it.
 */
export class WorkerInProcess extends EventTarget {
  #answer = loadEngine().then(({ answerQuestions }) => answerQuestions())
  #ended = false

  postMessage(question: EngineQuestion): void {
    const copy = structuredClone(question)
    void this.#answer.then((answer) => {
      if (this.#ended) return
      this.dispatchEvent(new MessageEvent('message', { data: structuredClone(answer(copy)) }))
    })
  }

  terminate(): void {
    this.#ended = true
  }
}
