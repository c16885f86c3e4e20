import { describe, expect, it } from 'vitest'
import { createLog, describeError, scrub } from './log.ts'

function logged(what: object): string {
  const lines: string[] = []
  createLog('info', { write: (line) => void lines.push(line) }).info(what, 'probe')
  return lines.join('')
}

describe('the log', () => {
  it('hides secrets by the name of their field, however deep', () => {
    const line = logged({
      email: 'secret-1',
      person: { password: 'secret-2' },
      req: { headers: { cookie: 'secret-3', 'set-cookie': 'secret-4' } },
      trial: { note: 'secret-5' },
    })
    expect(line).toContain('[hidden]')
    expect(line).not.toContain('secret')
  })

  it('tells an error with where it arose, without the addresses in its words', () => {
    const line = logged({ err: new Error('550 no mailbox person@example.org here') })
    expect(line).toContain('550 no mailbox [address] here')
    expect(line).toContain('log.test.ts')
    expect(line).not.toContain('person@')
  })

  it('tells what is thrown and is no error', () => {
    expect(describeError('out of paper')).toEqual({ message: 'out of paper' })
  })

  it.each([
    ['/api/invitations/abc-DEF_123', '/api/invitations/[token]'],
    ['/reset/abc-DEF_123?x=1', '/reset/[token]?x=1'],
    ['see https://club.example.org/invite/abc', 'see https://club.example.org/invite/[token]'],
    ['/api/people/invitations/:invitationId', '/api/people/invitations/:invitationId'],
    ['/api/sessions/1234', '/api/sessions/1234'],
  ])('writes %s as %s', (text, expected) => {
    expect(scrub(text)).toBe(expected)
  })
})
