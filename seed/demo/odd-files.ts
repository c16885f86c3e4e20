import type { DemoDay } from './calendar.ts'
import type { DemoFile } from './drop-files.ts'

/** The opening of a PNG picture: what somebody drops by mistake. */
const picture = Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 73, 72, 68, 82])
const notes = 'Warm-up at 17:00, plates zeroed twice.\nThird jump of the hurdlers repeated.\n'

/** On the latest day somebody typed names by hand, in a hurry: they name nobody for sure, and stay in the Tray. */
export function misnamed(files: readonly DemoFile[], day: DemoDay): DemoFile[] {
  const names: Record<number, string> = { 7: 'second try.csv', 12: 'X 1.csv', 13: 'X 2.csv' }
  return files.map((file, i) => (day.latest && names[i] ? { ...file, fileName: names[i] } : file))
}

/** Files that no squad's day goes without: one twice, a picture, names that name nobody. */
export function oddFiles(files: readonly DemoFile[], squad: number, day: DemoDay): DemoFile[] {
  const twice = (at: number, fileName: string): DemoFile => ({ fileName, bytes: files[at].bytes })
  // The same bytes under another name: the product knows them again.
  if (squad === 2 && day.index === 7) return [twice(4, 'copy of jump (1).tsv')]
  if (!day.latest) return []
  const bytesOf = (bytes: Uint8Array) => () => Promise.resolve(bytes)
  return [
    squad === 0
      ? { fileName: 'IMG_2041.csv', bytes: bytesOf(picture) }
      : { fileName: `notes-${squad}.txt`, bytes: bytesOf(new TextEncoder().encode(notes)) },
    twice(0, 'dropped twice.csv'),
  ]
}
