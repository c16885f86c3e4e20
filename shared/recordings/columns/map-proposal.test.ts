import { describe, expect, it } from 'vitest'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import { proposeMapOf, readRecording } from '../read-recording.ts'
import type { MapRequest } from '../result.ts'

const { channels } = recordJump(makeJump({ stanceS: 0.5 }), { durationS: 1.9, sampleRateHz: 100 })
const left = Array.from(channels.left ?? [], (newtons) => newtons * 1.06)
const right = Array.from(channels.right ?? [], (newtons) => newtons * 0.94)

const file = (head: string, ...columns: ((row: number) => string)[]): Uint8Array => {
  const rows = left.map((_, row) => columns.map((column) => column(row)).join(','))
  return new TextEncoder().encode([...(head === '' ? [] : [head]), ...rows].join('\n') + '\n')
}
const seconds = (row: number): string => (row / 100).toFixed(2)
const leftN = (row: number): string => (left[row] ?? 0).toFixed(2)
const rightN = (row: number): string => (right[row] ?? 0).toFixed(2)

function requestOf(bytes: Uint8Array): MapRequest {
  const result = readRecording(bytes, 'a.csv')
  if (result.ok || !result.needsMap) throw new Error('The file was expected to wait for its map.')
  return result.needsMap
}

describe('a file whose columns only a person can settle', () => {
  const request = requestOf(file('', seconds, leftN, rightN))

  it('comes with a map that is likely and that reads it once it is confirmed', () => {
    expect(request.proposal.map).toMatchObject({
      time: { index: 0, unit: 's' },
      forces: [
        { index: 1, unit: 'N', channel: 'left' },
        { index: 2, unit: 'N', channel: 'right' },
      ],
    })
    expect(request.proposal.confidence).toBeLessThan(0.5)
    const confirmed = readRecording(file('', seconds, leftN, rightN), 'a.csv', { map: request.proposal.map })
    expect(confirmed.ok && Object.keys(confirmed.recording.channels)).toStrictEqual(['left', 'right'])
  })

  it('says of each column how sure it is, why, and what else it could be', () => {
    const [time, force] = request.proposal.columns
    expect(time).toMatchObject({ role: { kind: 'time', unit: 's' }, confidence: 0.4 })
    expect(force?.reasons).toStrictEqual(['It has no heading, and moves as a force does.'])
    expect(force?.alternatives[0]).toStrictEqual({ kind: 'force', channel: 'right', unit: 'N' })
    expect(force?.alternatives).toContainEqual({ kind: 'unused' })
  })

  it('shows its first rows and a mini trace of each column', () => {
    const { preview } = request
    expect(preview.rows).toHaveLength(8)
    expect(preview.rows[0]).toStrictEqual(['0.00', leftN(0), rightN(0)])
    expect(preview.traces.map(({ index }) => index)).toStrictEqual([0, 1, 2])
    expect(Math.max(...(preview.traces[1]?.greatest ?? []))).toBeCloseTo(Math.max(...left), 1)
    expect(preview.traces[1]?.least).toHaveLength(120)
  })

  it('waits for its rate where nothing states it, and is read with the one that is confirmed', () => {
    const untimed = file('Left (N),Right (N)', leftN, rightN)
    const { proposal } = requestOf(untimed)
    expect(proposal.map.time).toBeNull()
    const read = readRecording(untimed, 'a.csv', { map: { ...proposal.map, sampleRateHz: 100 } })
    expect(read).toMatchObject({ ok: true, recording: { sampleRateHz: 100 } })
  })

  it('shows nothing of a cell that could be taken for something else', () => {
    const { preview } = requestOf(file('Time (s),Le\u202Eft', seconds, leftN))
    expect(preview.headings[1]).toBe('Le\uFFFDft')
  })
})

describe('proposeMapOf', () => {
  it('explains a map that needs nobody, so that it can be changed all the same', () => {
    const proposed = proposeMapOf(
      file('Time (s),Left (N),Right (N),Phase', seconds, leftN, rightN, () => 'stance'),
    )
    expect(proposed.ok && proposed.request.proposal).toMatchObject({
      confidence: 1,
      columns: [
        { role: { kind: 'time' } },
        {},
        {},
        { role: { kind: 'unused' }, reasons: ['It holds no numbers.'] },
      ],
    })
  })

  it('is less sure of what the weight decides than of what a heading says', () => {
    const shear = (row: number): string => (10 * Math.sin(row / 7)).toFixed(2)
    const proposed = proposeMapOf(file('Time (s),Fx (N),Fy (N),Fz (N)', seconds, shear, leftN, shear))
    const column = proposed.ok ? proposed.request.proposal.columns[2] : undefined
    expect(column).toMatchObject({ role: { kind: 'force' }, confidence: 0.8 })
    expect(column?.reasons).toContain('Of the components of its plate it carries the weight.')
  })
})

describe('the fingerprint of a head', () => {
  const printOf = (head: string, separator = ','): string => {
    const result = proposeMapOf(
      new TextEncoder().encode(
        new TextDecoder().decode(file(head, seconds, leftN, rightN)).replaceAll(',', separator),
      ),
    )
    if (!result.ok) throw new Error(result.error.sentence)
    return result.request.fingerprint
  }

  it('is the same however the same headings are spaced, written and delimited', () => {
    const print = printOf('Time (s),Left (N),Right (N)')
    expect(print).toMatch(/^[0-9a-f]{32}$/u)
    expect(printOf('time (s), LEFT (N),Right  (N)')).toBe(print)
    expect(printOf('"Time (s)","Left (N)","Right (N)"')).toBe(print)
    expect(printOf('Time (s),Left (N),Right (N)', ';')).toBe(print)
  })

  it('finds a map that fits, whatever the case of the headings', () => {
    const map = {
      time: { index: 0, name: 'time (S)', unit: 's' },
      forces: [{ index: 1, name: 'LEFT  (n)', unit: 'N', channel: 'single' }],
    } as const
    const read = readRecording(file('Time (s),Left (N),Right (N)', seconds, leftN, rightN), 'a.csv', {
      map: { ...map, forces: [...map.forces] },
    })
    expect(read.ok && Object.keys(read.recording.channels)).toStrictEqual(['single'])
  })

  it('differs with headings, their order and their units', () => {
    const prints = [
      'Time (s),Left (N),Right (N)',
      'Time (s),Right (N),Left (N)',
      'Time (s),Left (kN),Right (kN)',
      '',
    ].map((head) => printOf(head))
    expect(new Set(prints).size).toBe(4)
  })
})
