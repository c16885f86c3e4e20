/** Opening bytes of files that are no text, by their published signatures. */
const SIGNATURES: { kind: string; bytes: number[]; at?: number }[] = [
  { kind: 'a PNG picture', bytes: [0x89, 0x50, 0x4e, 0x47] },
  { kind: 'a JPEG picture', bytes: [0xff, 0xd8, 0xff] },
  { kind: 'a GIF picture', bytes: [0x47, 0x49, 0x46, 0x38] },
  { kind: 'a HEIC picture or a film', bytes: [0x66, 0x74, 0x79, 0x70], at: 4 },
  { kind: 'a WebP picture or a sound', bytes: [0x52, 0x49, 0x46, 0x46] },
  { kind: 'a PDF document', bytes: [0x25, 0x50, 0x44, 0x46, 0x2d] },
  { kind: 'a zip archive or a workbook', bytes: [0x50, 0x4b, 0x03, 0x04] },
  { kind: 'an old-style office document', bytes: [0xd0, 0xcf, 0x11, 0xe0] },
  { kind: 'a gzip archive', bytes: [0x1f, 0x8b] },
  { kind: 'a 7z archive', bytes: [0x37, 0x7a, 0xbc, 0xaf] },
]

/** How much of a file is looked at to tell text from anything else. */
const LOOKED_AT = 4096

function beginsWith(bytes: Uint8Array, signature: number[], at = 0): boolean {
  return signature.every((value, i) => bytes[at + i] === value)
}

/** Length of a UTF-8 byte order mark at the start, 0 or 3. */
export function byteOrderMarkLength(bytes: Uint8Array): number {
  return beginsWith(bytes, [0xef, 0xbb, 0xbf]) ? 3 : 0
}

/** What a file is when it is not text, in words that fit after "The file is"; null for text. */
export function kindIfNotText(bytes: Uint8Array): string | null {
  const known = SIGNATURES.find((signature) => beginsWith(bytes, signature.bytes, signature.at))
  if (known) return known.kind
  const looked = Math.min(bytes.length, LOOKED_AT)
  // Text holds tabs, line breaks and form feeds, and no other control byte.
  let controls = 0
  for (let i = 0; i < looked; i++) {
    const byte = bytes[i] as number
    if (byte < 0x20 && (byte < 0x09 || byte > 0x0d)) controls++
  }
  return controls > looked / 200 ? 'binary data of no known kind' : null
}
