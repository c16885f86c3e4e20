import { expect, test } from 'vitest'
import { latestOnly } from './latest-only.ts'

/** An engine that answers when told. */
function slowEngine() {
  const asked: { question: number; answer: (reply: string) => void; fail: () => void }[] = []
  const heard: string[] = []
  const ask = latestOnly(
    (question: number) =>
      new Promise<string>((answer, fail) => asked.push({ question, answer, fail: () => fail(new Error()) })),
    { onAnswer: (answer) => heard.push(answer), onFailure: () => heard.push('failed') },
  )
  return { ask, asked, heard }
}
const settled = () => new Promise((done) => setTimeout(done))

test('while one question is at work only the newest of the others is asked after it', async () => {
  const { ask, asked, heard } = slowEngine()
  for (const question of [1, 2, 3, 4]) ask(question)
  expect(asked.map(({ question }) => question)).toEqual([1])
  asked[0]!.answer('one')
  await settled()
  expect(asked.map(({ question }) => question)).toEqual([1, 4])
  asked[1]!.answer('four')
  await settled()
  expect(heard).toEqual(['one', 'four'])
  ask(5)
  expect(asked.at(-1)?.question).toBe(5)
})

test('a failed answer is told and does not stop what waits', async () => {
  const { ask, asked, heard } = slowEngine()
  ask(1)
  ask(2)
  asked[0]!.fail()
  await settled()
  asked[1]!.answer('two')
  await settled()
  expect(heard).toEqual(['failed', 'two'])
})
