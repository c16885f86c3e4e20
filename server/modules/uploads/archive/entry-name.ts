import { type Entry, getFileNameLowLevel, validateFileName } from 'yauzl'
import { fileNameOnly } from '../../../../shared/recordings/file-name.ts'
import { ReadFault } from '../../../../shared/recordings/errors.ts'
import { shown } from '../../../../shared/recordings/safe-text.ts'

const utf8 = new TextDecoder('utf-8', { fatal: true })

/**
 * An entry's path as its maker wrote it, with `/` between folders. Some systems write UTF-8 without saying so: what
 * is valid UTF-8 is taken as such, the rest by the flag, the Unicode extra field or code page 437.
 */
export function entryPath({ generalPurposeBitFlag, fileNameRaw, extraFields }: Entry): string {
  const declared = getFileNameLowLevel(generalPurposeBitFlag, fileNameRaw, extraFields, false)
  if (/^[\x20-\x7e]*$/u.test(declared)) return declared
  try {
    return utf8.decode(fileNameRaw).replace(/\\/gu, '/').normalize('NFC')
  } catch {
    return declared.normalize('NFC')
  }
}

/**
 * Nothing of an archive is ever written to a disk under its own name; a name that tries to lead out of its folder,
 * or to look like another, still says that the archive was not made by packing recordings.
 * @throws ReadFault `unsafe-archive`
 */
export function refuseUnsafePath(path: string): void {
  const isOutside = validateFileName(path) !== null
  // eslint-disable-next-line no-control-regex -- a zero byte and its like are what is looked for
  if (!isOutside && !/[\x00-\x1f\x7f]/u.test(path)) return
  const seen = shown(path)
  const sentence = isOutside
    ? `The archive names a file outside its own folder: “${seen}”.`
    : `The archive names a file with characters that no name has: “${seen}”.`
  throw new ReadFault('unsafe-archive', sentence, { seen })
}

/** Folders, and what systems put into archives by themselves: no recordings. */
export function isSkipped(path: string): boolean {
  if (path.endsWith('/')) return true
  const parts = path.split('/')
  const name = parts.at(-1) ?? ''
  return parts.includes('__MACOSX') || name.startsWith('.') || /^(?:thumbs\.db|desktop\.ini)$/iu.test(name)
}

export const nameOf = (path: string): string => fileNameOnly(path).name
