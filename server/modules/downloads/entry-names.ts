import { fileNameOnly } from '../../../shared/recordings/file-name.ts'

/** What no system takes in a name, and dots at its end. */
const NOT_IN_A_NAME = /[<>:"/\\|?*]|[. ]+$/gu

/** Names that one system keeps for its devices, whatever their ending. */
const DEVICE = /^(?:con|prn|aux|nul|com\d|lpt\d)(?:\.|$)/iu

/** A name that every system can unpack: no path, no device, never empty. */
export function safeName(name: string): string {
  const plain = fileNameOnly(name.replace(/[\\/]/gu, '_')).name.replace(NOT_IN_A_NAME, '_')
  return DEVICE.test(plain) ? `_${plain}` : plain
}

/** Gives each entry of an archive a path of its own: the second of one name gets a number before its ending. */
export function distinctPaths(): (folder: string, name: string) => string {
  const taken = new Set<string>()
  return (folder, name) => {
    const safe = safeName(name)
    const dot = safe.lastIndexOf('.')
    const [stem, ending] = dot > 0 ? [safe.slice(0, dot), safe.slice(dot)] : [safe, '']
    let path = `${folder}${safe}`
    // Capitals do not tell files apart everywhere.
    for (let n = 2; taken.has(path.toLowerCase()); n++) path = `${folder}${stem} (${n})${ending}`
    taken.add(path.toLowerCase())
    return path
  }
}
