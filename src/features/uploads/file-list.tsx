import type { Upload } from '../../../shared/contracts/uploads.ts'
import { Button } from '../../components/button.tsx'
import { fileProgress, type FileProgress } from './file-progress.ts'
import type { QueuedFile, UploadQueue } from './upload-queue.ts'

interface Props {
  files: readonly QueuedFile[]
  uploads: readonly Upload[]
  queue: UploadQueue
}

/** The files of this page's drop that are not settled yet, each with its own progress, error and way on. */
export function FileList({ files, uploads, queue }: Props) {
  const byId = new Map(uploads.map((upload) => [upload.id, upload]))
  const rows = files
    .map((file) => fileProgress(file, byId.get(file.uploadId ?? '')))
    .filter((row) => !row.done)
  if (rows.length === 0) return null
  return (
    <ul
      aria-label="Files on their way"
      className="max-h-72 overflow-y-auto border-t border-rule"
      tabIndex={0}
    >
      {rows.map((row) => (
        <FileRow key={row.key} row={row} queue={queue} />
      ))}
    </ul>
  )
}

function FileRow({ row, queue }: { row: FileProgress; queue: UploadQueue }) {
  return (
    <li className="flex flex-wrap items-center gap-x-3 border-b border-rule-2 py-1 text-small">
      <span className="min-w-0 font-semibold break-all">{row.fileName}</span>
      <span className="text-ink-2">{row.words}</span>
      {row.sent !== null && (
        <progress
          className="tape-progress ms-auto"
          max={1}
          value={row.sent}
          aria-label={`${row.fileName} sent`}
        />
      )}
      {row.problem && (
        <span className="w-full">
          {row.problem.sentence} <span className="text-ink-2">{row.problem.remedy}</span>
        </span>
      )}
      {row.canRetry && (
        <Button look="word" onClick={() => queue.retry(row.key)}>
          Try again <span className="sr-only">{row.fileName}</span>
        </Button>
      )}
      {row.canRemove && (
        <Button look="word" onClick={() => queue.remove(row.key)}>
          {row.problem ? 'Dismiss' : 'Cancel'} <span className="sr-only">{row.fileName}</span>
        </Button>
      )}
    </li>
  )
}
