import { foldName } from '../../../shared/contracts/names.ts'

export interface Candidate {
  id: string
  /** As `foldName` gives it. */
  nameKey: string
}

/**
 * The athlete that a file name names: the one candidate whose every word stands in it, as a word or written
 * together with the others (`ostrowmara`). Nobody where none fits or more than one does: an initial, half a
 * name, or a name that another athlete's name contains is never guessed at, since a figure on the wrong
 * athlete costs more than a minute at the Tray.
 */
export function matchAthlete(fileName: string, candidates: readonly Candidate[]): string | null {
  const words = wordsOf(fileName)
  const named = candidates.filter((candidate) => names(words, candidate.nameKey))
  return named.length === 1 ? named[0].id : null
}

/** Names of more words are met word by word alone: the ways to write n words together are n factorial. */
const mostWordsTogether = 6

/** Words of a file name without its extension, each also without the digits glued to it (`ostrow2`). */
function wordsOf(fileName: string): Set<string> {
  const words = foldName(fileName.replace(/\.[a-z0-9]{1,5}$/iu, '')).split(' ')
  return new Set([...words, ...words.flatMap((word) => word.split(/\p{N}+/u))].filter((word) => word !== ''))
}

function names(words: ReadonlySet<string>, nameKey: string): boolean {
  const wanted = [...new Set(nameKey.split(' '))].filter((word) => word !== '')
  if (wanted.length === 0) return false
  const met =
    wanted.length > mostWordsTogether ? words : new Set([...words].flatMap((word) => piecesOf(word, wanted)))
  return wanted.every((word) => met.has(word))
}

/** The words of a name, each at most once, that written together make up the whole word; none if they do not. */
function piecesOf(word: string, wanted: readonly string[]): readonly string[] {
  for (const [i, piece] of wanted.entries()) {
    if (word === piece) return [piece]
    if (!word.startsWith(piece)) continue
    const rest = piecesOf(word.slice(piece.length), wanted.toSpliced(i, 1))
    if (rest.length > 0) return [piece, ...rest]
  }
  return []
}
