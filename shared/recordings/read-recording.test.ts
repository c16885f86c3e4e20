import { describe, expect, it } from 'vitest'
import { fileStyles } from '../../seed/synthetic/file-styles.ts'
import { makeJump } from '../../seed/synthetic/jump.ts'
import { seededRandom } from '../../seed/synthetic/random.ts'
import type { Random } from '../../seed/synthetic/random.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'
import { readErrorCodes } from './errors.ts'
import { MAX_FORCE_N } from './limits.ts'
import { readRecording } from './read-recording.ts'

const recording = recordJump(makeJump({ stanceS: 0.3 }), { durationS: 0.8, sampleRateHz: 250 })
const files = Object.values(fileStyles).map((style) => writeDelimited(recording, style))

/** A copy with some bytes changed, cut out, repeated or swapped for marks that mean something to a reader. */
function mutated(bytes: Uint8Array, random: Random): Uint8Array {
  const at = Math.floor(random.next() * bytes.length)
  const length = Math.floor(random.between(1, 80))
  const piece = bytes.slice(at, at + length)
  switch (random.pick(['change', 'cut', 'repeat', 'end', 'mark'] as const)) {
    case 'change':
      return bytes.with(at, Math.floor(random.next() * 256))
    case 'cut':
      return Buffer.concat([bytes.slice(0, at), bytes.slice(at + length)])
    case 'repeat':
      return Buffer.concat([bytes.slice(0, at), piece, bytes.slice(at)])
    case 'end':
      return bytes.slice(0, at)
    case 'mark':
      return bytes.with(at, random.pick([0x22, 0x2c, 0x3b, 0x09, 0x0a, 0x0d, 0x2d, 0x2e, 0x65, 0x00]))
  }
}

describe('readRecording', () => {
  it('answers damaged files with a reading that is whole or with an error of the catalogue', () => {
    const random = seededRandom(2026)
    let read = 0
    for (let i = 0; i < 300; i++) {
      let bytes = random.pick(files)
      for (let k = 0; k <= i % 3; k++) bytes = mutated(bytes, random)
      const result = readRecording(bytes, 'damaged.csv')
      if (!result.ok) {
        expect(readErrorCodes).toContain(result.error.code)
        continue
      }
      read++
      const channels = Object.values(result.recording.channels)
      expect(result.recording.sampleRateHz).toBeGreaterThan(0)
      for (const force of channels) {
        expect(force.length).toBe(channels[0]?.length)
        expect(force.every((newtons) => Math.abs(newtons) <= MAX_FORCE_N)).toBe(true)
      }
    }
    expect(read).toBeGreaterThan(100)
  })

  it('is not held up by a heading made of thousands of marks', () => {
    const text = `Time (s),${'. '.repeat(30_000)}x\n${Array.from({ length: 20 }, (_, i) => `${i / 1000},5`).join('\n')}`
    expect(readRecording(new TextEncoder().encode(text), 'marks.csv')).toMatchObject({
      ok: false,
      error: { code: 'no-force-column' },
    })
  })

  it('takes a number of a million figures for damage', () => {
    const rows = Array.from(
      { length: 20 },
      (_, i) => `${i / 1000},${i === 9 ? '9'.repeat(1_000_000) : '700'}`,
    )
    const text = `Time (s),Force (N)\n${rows.join('\n')}`
    const result = readRecording(new TextEncoder().encode(text), 'long.csv')
    expect(result).toMatchObject({ ok: true, recording: { filledSamples: 1 } })
  })
})
