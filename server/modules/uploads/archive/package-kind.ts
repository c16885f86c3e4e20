import { ReadFault } from '../../../../shared/recordings/errors.ts'
import type { Directory } from './directory.ts'

/** Zip archives that are one document: the parts by which each is told (ECMA-376; OpenDocument 1.3 part 2). */
const DOCUMENTS: { part: string; kind: string }[] = [
  { part: 'xl/workbook.bin', kind: 'a workbook in its binary form' },
  { part: 'word/document.xml', kind: 'a text document' },
  { part: 'ppt/presentation.xml', kind: 'a presentation' },
  { part: 'meta-inf/manifest.xml', kind: 'an OpenDocument file' },
]

/**
 * Whether a zip archive is a workbook or an archive of files.
 * @throws ReadFault `not-a-recording` for a document of another kind
 */
export function packageKind({ files }: Directory): 'workbook' | 'archive' {
  const paths = new Set(files.map(({ path }) => path.toLowerCase()))
  if (paths.has('xl/workbook.xml')) return 'workbook'
  const document = DOCUMENTS.find(({ part }) => paths.has(part))
  if (document)
    throw new ReadFault(
      'not-a-recording',
      `The file is ${document.kind}, neither a workbook nor delimited text.`,
    )
  return 'archive'
}

/** The first bytes of a zip archive, of an empty one, and of one whose first part was split off. */
export function isZip(bytes: Uint8Array): boolean {
  const [p, k, a, b] = bytes
  return p === 0x50 && k === 0x4b && ((a === 3 && b === 4) || (a === 5 && b === 6) || (a === 7 && b === 8))
}
