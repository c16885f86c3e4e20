import { describe, expect, it } from 'vitest'
import { decoyHash, hashPassword, passwordFits } from './passwords.ts'

describe('a password', () => {
  it('is kept as Argon2id with 19 MiB, two passes and a salt of its own', async () => {
    const [a, b] = [await hashPassword('chalk and tape'), await hashPassword('chalk and tape')]
    expect(a).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
    expect(a).not.toBe(b)
  })

  it('fits its own hash, and no other password does', async () => {
    const hash = await hashPassword('chalk and tape')
    expect(await passwordFits(hash, 'chalk and tape')).toBe(true)
    expect(await passwordFits(hash, 'Chalk and tape')).toBe(false)
    expect(await passwordFits(hash, '')).toBe(false)
  })

  it('without an account is weighed against a hash that costs the same, and never fits', async () => {
    const parameters = (hash: string) => hash.split('$').slice(0, 4)
    expect(parameters(decoyHash)).toEqual(parameters(await hashPassword('any')))
    expect(await passwordFits(null, 'any')).toBe(false)
  })
})
