import { readFileSync, statSync } from 'node:fs'
import { engineVersion } from '../../shared/mechanics/version.ts'
import { tooLargeError } from '../../shared/recordings/errors.ts'
import { MAX_FILE_BYTES } from '../../shared/recordings/limits.ts'
import { UsageError, readArguments, usage } from './analyse-arguments.ts'
import type { AnalyseArguments } from './analyse-arguments.ts'
import { failedEntry } from './analysis-document.ts'
import type { FileEntry } from './analysis-document.ts'
import { summaryLines } from './analysis-summary.ts'
import { fileEntries } from './file-entries.ts'

/** Reads one file from disk; whatever is wrong with it becomes an entry that says so. */
async function entriesOf(file: string, { given, settings }: AnalyseArguments): Promise<FileEntry[]> {
  try {
    const { size } = statSync(file)
    if (size > MAX_FILE_BYTES) return [failedEntry(file, null, tooLargeError(size))]
    return await fileEntries(file, readFileSync(file), given, settings)
  } catch (error) {
    if (!(error instanceof Error && 'code' in error)) throw error
    const sentence = `The file could not be opened (${String(error.code)}).`
    const remedy = 'Check its name and that it may be read.'
    return [failedEntry(file, null, { code: 'file-unreadable', sentence, remedy })]
  }
}

/** Prints the figures of the named files; answers the exit status. */
async function main(args: string[]): Promise<number> {
  const command = readArguments(args)
  const files: FileEntry[] = []
  for (const file of command.files) files.push(...(await entriesOf(file, command)))
  const text = command.summary
    ? files.flatMap(summaryLines).join('\n')
    : JSON.stringify({ engineVersion, settings: command.settings, files }, null, 2)
  process.stdout.write(`${text}\n`)
  return files.some((file) => file.error) ? 2 : 0
}

try {
  process.exitCode = await main(process.argv.slice(2))
} catch (error) {
  if (!(error instanceof UsageError)) throw error
  console.error(`${error.message}\n\n${usage}`)
  process.exitCode = 1
}
