import { crc32, deflateRawSync } from 'node:zlib'

/** One entry, as honest or as lying as a test wants it. */
export interface ZipEntry {
  /** Bytes where the text of a name cannot say it. */
  name: string | Uint8Array
  data?: Uint8Array | string
  /** 0 stored, 8 deflated (the usual), anything else as a number only. */
  method?: number
  /** General purpose flags: 1 encrypted, 0x800 name in UTF-8 (set for names as text). */
  flags?: number
  /** Upper half: the type and mode under Unix. */
  externalAttributes?: number
  /** What the directory says in place of the truth. */
  statedSize?: number
  statedCrc?: number
  /** Takes the data of the entry before it in place of its own. */
  sharesData?: boolean
}

const u16 = (value: number): Buffer => {
  const bytes = Buffer.alloc(2)
  bytes.writeUInt16LE(value)
  return bytes
}
const u32 = (value: number): Buffer => {
  const bytes = Buffer.alloc(4)
  bytes.writeUInt32LE(value >>> 0)
  return bytes
}

/** A zip archive written field by field from the published layout (APPNOTE 4.3), without any package. */
export function writeZip(entries: readonly ZipEntry[]): Uint8Array {
  const local: Buffer[] = []
  const directory: Buffer[] = []
  let at = 0
  let before = 0
  for (const entry of entries) {
    const { method = 8, externalAttributes = 0, sharesData = false } = entry
    const data = Buffer.from(entry.data ?? '')
    const packed = method === 8 ? deflateRawSync(data) : data
    const isText = typeof entry.name === 'string'
    const name = Buffer.from(entry.name)
    const flags = entry.flags ?? (isText ? 0x800 : 0)
    const common = [
      u16(20),
      u16(flags),
      u16(method),
      u32(0),
      u32(entry.statedCrc ?? crc32(data)),
      u32(packed.length),
      u32(entry.statedSize ?? data.length),
      u16(name.length),
      u16(0),
    ]
    const offset = sharesData ? before : at
    if (!sharesData) {
      const record = Buffer.concat([u32(0x04034b50), ...common, name, packed])
      local.push(record)
      before = at
      at += record.length
    }
    directory.push(
      Buffer.concat([
        u32(0x02014b50),
        u16(0x031e),
        ...common,
        u16(0),
        u16(0),
        u16(0),
        u32(externalAttributes),
        u32(offset),
        name,
      ]),
    )
  }
  const list = Buffer.concat(directory)
  const end = [
    u32(0x06054b50),
    u16(0),
    u16(0),
    u16(entries.length),
    u16(entries.length),
    u32(list.length),
    u32(at),
    u16(0),
  ]
  return new Uint8Array(Buffer.concat([...local, list, ...end]))
}
