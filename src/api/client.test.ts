import { http, HttpResponse } from 'msw'
import { describe, expect, test } from 'vitest'
import { z } from 'zod'
import { endpoint } from '../../shared/contracts/endpoint.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { addressOf, call } from './client.ts'

const getThing = endpoint({
  method: 'GET',
  path: '/api/things/:thingId',
  access: 'public',
  params: z.strictObject({ thingId: z.string() }),
  query: z.strictObject({ page: z.coerce.number().default(1), search: z.string().optional() }),
  response: z.strictObject({ size: z.number() }),
})
const input = { params: { thingId: '1' } }
const answers = (respond: () => Response) => server.use(http.get('*/api/things/1', respond))

describe('addressOf(endpoint, input)', () => {
  test('fills in parameters, encoded, and leaves out of the query what is empty', () => {
    const address = addressOf(getThing, { params: { thingId: 'a/b' }, query: { page: 2, search: '' } })
    expect(address).toBe('/api/things/a%2Fb?page=2')
  })
})

describe('call(endpoint, input)', () => {
  test('hands back an answer that the contract knows', async () => {
    answers(() => HttpResponse.json({ size: 3 }))
    expect(await call(getThing, input)).toEqual({ size: 3 })
  })
  test('a refusal keeps its code, sentence and details', async () => {
    answers(() =>
      HttpResponse.json(
        { error: { code: 'not-found', message: 'Not here.', details: { a: 1 } } },
        { status: 404 },
      ),
    )
    await expect(call(getThing, input)).rejects.toMatchObject({
      code: 'not-found',
      message: 'Not here.',
      details: { a: 1 },
    })
  })
  test.each([
    ['an answer of another shape', () => HttpResponse.json({ size: 'large' })],
    ['an answer with more than was agreed', () => HttpResponse.json({ size: 3, weight: 1 })],
    ['an answer that is no JSON', () => new HttpResponse('<html>')],
    ['a failure without a reason', () => new HttpResponse('Bad gateway', { status: 502 })],
    [
      'a failure with an unknown code',
      () => HttpResponse.json({ error: { code: 'odd', message: '' } }, { status: 400 }),
    ],
  ])('%s is told as unreadable', async (_, respond) => {
    answers(respond)
    await expect(call(getThing, input)).rejects.toMatchObject({ code: 'answer-unreadable' })
  })
  test('a cut line is told as no answer', async () => {
    answers(() => HttpResponse.error())
    await expect(call(getThing, input)).rejects.toMatchObject({ code: 'no-answer' })
  })
  test('a call that was given up stays a call that was given up', async () => {
    answers(() => HttpResponse.json({ size: 3 }))
    await expect(call(getThing, input, { signal: AbortSignal.abort() })).rejects.toMatchObject({
      name: 'AbortError',
    })
  })
})
