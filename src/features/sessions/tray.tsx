import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { DismissedUploads } from '../uploads/dismissed-uploads.tsx'
import { FileList } from '../uploads/file-list.tsx'
import { isOnItsWay, readCount } from '../uploads/file-progress.ts'
import { ArrivingUploads, needsPerson, TrayUpload } from '../uploads/tray-uploads.tsx'
import type { QueuedFile, UploadQueue } from '../uploads/upload-queue.ts'
import type { AthleteChoice } from '../trials/move-trial-dialog.tsx'
import { TrayTrial } from './tray-trial.tsx'

interface Props {
  trials: readonly SheetTrial[]
  uploads: readonly Upload[]
  athletes: readonly AthleteChoice[]
  files: readonly QueuedFile[]
  queue: UploadQueue
}

/** What is not on an athlete yet, what could not be read, and how far the reading has come. */
export function Tray({ trials, uploads, athletes, files, queue }: Props) {
  const elsewhere = uploads.filter((upload) => !isOnItsWay(upload, files))
  const waiting = elsewhere.filter(needsPerson)
  const count = readCount(uploads, files)
  return (
    <section aria-label="Tray" className="no-print mb-4 border border-dashed border-edge bg-sheet px-4 py-2">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1">
        <h2 className="text-panel font-semibold">
          Tray{' '}
          <span className="text-small font-normal text-ink-2">
            {trials.length + waiting.length === 0
              ? uploads.length + files.length === 0
                ? 'no recordings yet'
                : 'empty: nothing waits for you'
              : inTrayWords(trials.length, waiting.length)}
          </span>
        </h2>
        <ReadProgress read={count.read} of={count.of} />
      </div>
      {uploads.length + files.length === 0 && <HowToBegin />}
      <FileList files={files} uploads={uploads} queue={queue} />
      <ArrivingUploads uploads={elsewhere.filter((upload) => upload.arriving)} />
      {trials.length + waiting.length > 0 && (
        <ul
          aria-label="Waiting in the Tray"
          className="max-h-80 overflow-y-auto border-t border-rule"
          tabIndex={0}
        >
          {trials.map((trial) => (
            <TrayTrial key={trial.id} trial={trial} athletes={athletes} />
          ))}
          {waiting.map((upload) => (
            <TrayUpload key={upload.id} upload={upload} />
          ))}
        </ul>
      )}
      <DismissedUploads uploads={uploads.filter((upload) => upload.dismissed !== null)} />
    </section>
  )
}

function HowToBegin() {
  return (
    <p className="max-w-prose border-t border-rule py-2">
      Drop the plates’ files anywhere on this page, or press Add files. A file whose name holds an athlete’s
      name goes to that athlete; the others wait here.
    </p>
  )
}

function inTrayWords(trials: number, files: number): string {
  const parts = [
    trials > 0 ? `${trials} ${trials === 1 ? 'trial' : 'trials'} without an athlete` : '',
    files > 0 ? `${files} ${files === 1 ? 'file' : 'files'} to look at` : '',
  ]
  return parts.filter(Boolean).join(', ')
}

function ReadProgress({ read, of }: { read: number; of: number }) {
  if (of === 0) return null
  const words = `${read} of ${of} ${of === 1 ? 'file' : 'files'} read`
  return (
    <p role="status" className="flex items-center gap-3 text-small text-ink-2">
      {words}
      {read < of && <progress className="tape-progress" max={of} value={read} aria-label={words} />}
    </p>
  )
}
