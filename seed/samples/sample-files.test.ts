import { readFileSync, readdirSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { sampleFiles } from './sample-files.ts'

const folder = `${import.meta.dirname}/../../public/samples`
const files = sampleFiles()

describe('the sample files', () => {
  it('are those that the product offers, byte for byte', () => {
    const offered = readdirSync(folder).filter((name) => name.endsWith('.csv'))
    expect(offered.sort()).toStrictEqual(Object.keys(files).sort())
    for (const name of offered)
      expect(readFileSync(`${folder}/${name}`).equals(files[name] ?? new Uint8Array(0))).toBe(true)
  })

  it.each(Object.entries(files))(
    '%s is read, says that it is invented, and is of a size to send by mail',
    (name, bytes) => {
      expect(readRecording(bytes, name).ok).toBe(true)
      expect(new TextDecoder().decode(bytes.subarray(0, 60))).toContain('Invented recording')
      expect(bytes.length).toBeLessThan(200_000)
    },
  )
})
