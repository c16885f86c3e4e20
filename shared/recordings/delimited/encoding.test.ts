import { describe, expect, it } from 'vitest'
import { decodeBytes } from './encoding.ts'

const text = 'Zeit (s);Stärke (N)\n0,001;812,5\n'
const utf16 = (order: 'le' | 'be', marked: boolean): Uint8Array => {
  const bytes = Buffer.from((marked ? '\uFEFF' : '') + text, 'utf16le')
  return new Uint8Array(order === 'be' ? bytes.swap16() : bytes)
}

describe('decodeBytes', () => {
  it.each([
    ['utf-8', false, new Uint8Array(Buffer.from(text))],
    ['utf-8', true, new Uint8Array(Buffer.from(`\uFEFF${text}`))],
    ['windows-1252', false, new Uint8Array(Buffer.from(text, 'latin1'))],
    ['utf-16le', true, utf16('le', true)],
    ['utf-16be', true, utf16('be', true)],
    ['utf-16le', false, utf16('le', false)],
    ['utf-16be', false, utf16('be', false)],
  ])('reads the words of %s (byte order mark: %s)', (encoding, byteOrderMark, bytes) => {
    const decoded = decodeBytes(bytes)
    expect(decoded).toMatchObject({ encoding, byteOrderMark })
    expect(decoded.decode(decoded.bytes)).toBe(text)
  })

  it('does not copy bytes that are ready to be read', () => {
    const bytes = new Uint8Array(Buffer.from(text))
    expect(decodeBytes(bytes).bytes).toBe(bytes)
  })
})
