import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { seededRandom } from '../../../../seed/synthetic/random.ts'
import { type ZipEntry, writeZip } from '../../../../tests/setup/write-zip.ts'
import { ReadFault, readErrorCodes } from '../../../../shared/recordings/errors.ts'
import { MAX_FILE_BYTES } from '../../../../shared/recordings/limits.ts'
import { readDirectory } from './directory.ts'
import { type Archive, readArchive } from './read-archive.ts'

const text = 'Time (s),Force (N)\n0,700\n0.001,701\n'
const file = (name: ZipEntry['name'], more: Partial<ZipEntry> = {}): ZipEntry => ({
  name,
  data: text,
  ...more,
})

async function read(bytes: Uint8Array): Promise<Archive> {
  return readArchive(bytes, await readDirectory(bytes))
}

async function faultOf(bytes: Uint8Array): Promise<ReadFault['readError']> {
  const fault = await read(bytes).catch((error: unknown) => error)
  if (!(fault instanceof ReadFault)) throw new Error('The archive was read, and a fault was expected.')
  return fault.readError
}

describe('an archive', () => {
  it('gives its files with their hashes, and leaves out folders and what systems add', async () => {
    const archive = await read(
      writeZip([
        { name: 'day/' },
        file('day/mara_1.csv'),
        file('day/mara_2.csv', { method: 0 }),
        file('__MACOSX/day/._mara_1.csv'),
        file('day/.DS_Store'),
        file('Thumbs.db'),
      ]),
    )
    const sha256 = createHash('sha256').update(text).digest('hex')
    expect(archive).toMatchObject({
      skipped: 3,
      members: [
        {
          path: 'day/mara_1.csv',
          name: 'mara_1.csv',
          sizeBytes: text.length,
          sha256,
          packed: { method: 'deflated' },
        },
        {
          path: 'day/mara_2.csv',
          name: 'mara_2.csv',
          sizeBytes: text.length,
          sha256,
          packed: { method: 'stored' },
        },
      ],
    })
  })

  it('says where its bytes stand, so that a file can be read without the rest', async () => {
    const bytes = writeZip([file('a.csv'), file('b.csv', { method: 0, data: 'stored as it is' })])
    const [, stored] = (await read(bytes)).members
    if (!stored || 'error' in stored) throw new Error('The file is lost.')
    const { start, bytes: length } = stored.packed
    expect(Buffer.from(bytes.subarray(start, start + length)).toString()).toBe('stored as it is')
  })

  it('has names in UTF-8, said or unsaid, and in the old code page', async () => {
    const names = [
      file('Zoë Łukaś.csv'),
      file(Buffer.from('Anaïs.csv', 'utf8')),
      // é in code page 437.
      file(Uint8Array.from([0x52, 0x65, 0x6e, 0x82, 0x2e, 0x63, 0x73, 0x76])),
      // As some systems take letters apart: e and its mark.
      file('Andre\u0301.csv'),
      file('folder\\of another system.csv'),
    ]
    const { members } = await read(writeZip(names))
    expect(members.map(({ name }) => name)).toStrictEqual([
      'Zoë Łukaś.csv',
      'Anaïs.csv',
      'René.csv',
      'André.csv',
      'of another system.csv',
    ])
  })

  it('loses a damaged file and keeps the others', async () => {
    const { members } = await read(
      writeZip([
        file('a.csv', { statedCrc: 1 }),
        file('b.csv'),
        file('c.csv', { method: 9 }),
        file('d.csv', { statedSize: 5 }),
      ]),
    )
    expect(members.map((member) => ('error' in member ? member.error.code : 'whole'))).toStrictEqual([
      'corrupt-file',
      'whole',
      'unsupported-packing',
      'corrupt-file',
    ])
  })
})

describe('an archive is refused whole', () => {
  it.each([
    ['../../etc/passwd', 'outside'],
    ['day/../../x.csv', 'outside'],
    ['/etc/x.csv', 'outside'],
    ['C:\\day\\x.csv', 'outside'],
    ['..\\..\\x.csv', 'outside'],
    ['a\0b.csv', 'characters'],
    ['a\r\nb.csv', 'characters'],
  ])('that names a file %j', async (name, word) => {
    const fault = await faultOf(writeZip([file('good.csv'), file(name)]))
    expect(fault).toMatchObject({ code: 'unsafe-archive', sentence: expect.stringContaining(word) as string })
    // eslint-disable-next-line no-control-regex -- what must not be shown
    expect(fault.sentence).not.toMatch(/[\x00-\x1f]/u)
  })

  it('that holds a link', async () => {
    const link = file('link.csv', { data: '/etc/passwd', method: 0, externalAttributes: 0o120777 * 65_536 })
    expect(await faultOf(writeZip([link]))).toMatchObject({ code: 'unsafe-archive', seen: 'link.csv' })
  })

  it('that holds one name twice', async () => {
    expect(await faultOf(writeZip([file('a.csv'), file('a.csv')]))).toMatchObject({
      code: 'unsafe-archive',
      sentence: 'The archive holds two files named “a.csv”.',
    })
  })

  it('whose files share their bytes', async () => {
    expect(await faultOf(writeZip([file('a.csv'), file('b.csv', { sharesData: true })]))).toMatchObject({
      code: 'unsafe-archive',
      sentence: 'Two files of the archive share the same bytes.',
    })
  })

  it('that is protected by a password', async () => {
    for (const flags of [1, 0x41]) {
      expect(await faultOf(writeZip([file('a.csv', { flags })]))).toMatchObject({ code: 'archive-protected' })
    }
  })

  it('that unfolds to two hundred times its size, whatever size it states', async () => {
    const zeros = Buffer.alloc(8 * 1024 * 1024)
    for (const statedSize of [zeros.length, 100]) {
      const bomb = writeZip([file('bomb.csv', { data: zeros, statedSize })])
      expect(bomb.length).toBeLessThan(20_000)
      expect(await faultOf(bomb)).toMatchObject({ code: 'unsafe-archive', seen: 'bomb.csv' })
    }
  })

  it('that holds a file over the limit of files', async () => {
    // Every second byte of noise packs to more than a two-hundredth.
    const random = seededRandom(7)
    const piece = Buffer.from(
      Array.from({ length: 65_536 }, (_, i) => (i % 8 === 0 ? random.next() * 256 : 0)),
    )
    const large = Buffer.concat(Array<Buffer>(MAX_FILE_BYTES / piece.length + 1).fill(piece))
    expect(await faultOf(writeZip([file('large.csv', { data: large })]))).toMatchObject({
      code: 'archive-too-large',
      sentence: '“large.csv” unfolds to more than 64 MiB.',
    })
  })

  it('that holds more files than are read', async () => {
    const many = Array.from({ length: 301 }, (_, i) => file(`${i}.csv`))
    expect(await faultOf(writeZip(many))).toMatchObject({
      code: 'archive-too-large',
      sentence: 'The archive holds 301 files, and 300 is the most that is read.',
    })
  })

  it('that holds thousands of folders and nothing else', async () => {
    expect(
      await faultOf(writeZip(Array.from({ length: 3001 }, (_, i) => ({ name: `${i}/` })))),
    ).toMatchObject({
      code: 'archive-too-large',
    })
    expect(await faultOf(writeZip([{ name: 'a/' }]))).toMatchObject({ code: 'empty-archive' })
    expect(await faultOf(writeZip([]))).toMatchObject({ code: 'empty-archive' })
  })

  it('that is cut', async () => {
    const whole = writeZip([file('a.csv'), file('b.csv')])
    for (const length of [10, whole.length - 1, whole.length - 30])
      expect(await faultOf(whole.slice(0, length))).toMatchObject({ code: 'corrupt-file' })
  })
})

describe('an archive that was changed anywhere', () => {
  it('gives its files or an error of the catalogue', async () => {
    const random = seededRandom(31)
    const whole = writeZip([file('a.csv'), file('day/b.csv', { method: 0 }), file('c.csv')])
    let files = 0
    for (let i = 0; i < 1500; i++) {
      const bytes = i % 5 === 0 ? whole.slice(0, Math.floor(random.next() * whole.length)) : whole.slice()
      for (let k = 0; k < i % 5; k++)
        bytes[Math.floor(random.next() * bytes.length)] = Math.floor(random.next() * 256)
      try {
        const { members } = await read(bytes)
        for (const member of members) {
          if ('error' in member) expect(readErrorCodes).toContain(member.error.code)
          else files++
        }
      } catch (error) {
        if (!(error instanceof ReadFault)) throw error
      }
    }
    expect(files).toBeGreaterThan(500)
  })
})
