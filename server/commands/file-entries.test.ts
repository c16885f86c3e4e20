import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { defaultSettings } from '../../shared/mechanics/settings.ts'
import { writeZip } from '../../tests/setup/write-zip.ts'
import { fileEntry } from './analysis-document.ts'
import { fileEntries } from './file-entries.ts'

const sample = new Uint8Array(readFileSync('public/samples/two-plates.csv'))
const entriesOf = (name: string, bytes: Uint8Array): ReturnType<typeof fileEntries> =>
  fileEntries(name, bytes, {}, defaultSettings)

describe('the entries of a file', () => {
  it('are one for each file of an archive, each as if it stood alone', async () => {
    const archive = writeZip([
      { name: 'day/two-plates.csv', data: sample },
      { name: 'stored.csv', data: sample, method: 0 },
      { name: 'lost.csv', data: sample, statedCrc: 1 },
      { name: 'inner.zip', data: writeZip([{ name: 'a.csv', data: sample }]) },
      { name: 'empty.csv', data: '' },
    ])
    const entries = await entriesOf('day.zip', archive)
    const alone = fileEntry('two-plates.csv', sample, {}, defaultSettings)
    expect(entries[0]).toStrictEqual({ ...alone, file: 'day.zip/day/two-plates.csv' })
    expect(entries[1]).toStrictEqual({ ...alone, file: 'day.zip/stored.csv' })
    expect(entries.slice(2).map(({ file, error }) => [file, error?.code])).toStrictEqual([
      ['day.zip/lost.csv', 'corrupt-file'],
      ['day.zip/inner.zip', 'unsafe-archive'],
      ['day.zip/empty.csv', 'empty-file'],
    ])
  })

  it('are one for a file that is no archive, and one for an archive that is not opened', async () => {
    expect(await entriesOf('a.csv', sample)).toStrictEqual([fileEntry('a.csv', sample, {}, defaultSettings)])
    const [refused] = await entriesOf('out.zip', writeZip([{ name: '../x.csv', data: sample }]))
    expect(refused).toMatchObject({ file: 'out.zip', error: { code: 'unsafe-archive' }, trials: [] })
  })
})
