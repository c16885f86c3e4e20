import { answerQuestions } from './answer-questions.ts'
import type { EngineQuestion } from './engine-tasks.ts'

const answer = answerQuestions()

self.addEventListener('message', (event: MessageEvent<EngineQuestion>) => {
  self.postMessage(answer(event.data))
})
