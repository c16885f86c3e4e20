import type { Upload } from '../../../shared/contracts/uploads.ts'
import { useMe } from '../../api/account/get-me.ts'
import { Button } from '../../components/button.tsx'
import { FormError } from '../../components/form-error.tsx'
import { counted } from '../../lib/counted.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { OriginalLink } from './original-link.tsx'
import { useTakeBackUpload } from './use-dismiss-upload.ts'

/** Files that were cleared from the Tray: nothing of them is gone, and each can be taken back. */
export function DismissedUploads({ uploads }: { uploads: readonly Upload[] }) {
  if (uploads.length === 0) return null
  return (
    <details className="border-t border-rule py-1.5 text-small">
      <summary className="cursor-pointer">Show {counted(uploads.length, 'dismissed file')}</summary>
      <ul aria-label="Dismissed files" className="max-h-72 overflow-y-auto" tabIndex={0}>
        {uploads.map((upload) => (
          <DismissedUpload key={upload.id} upload={upload} />
        ))}
      </ul>
    </details>
  )
}

function DismissedUpload({ upload }: { upload: Upload }) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const { takeBack, busy, error } = useTakeBackUpload(upload)
  return (
    <li className="flex flex-wrap items-baseline gap-x-3 border-b border-rule-2 py-1">
      <span className="font-semibold break-all">{upload.fileName}</span>
      {upload.dismissed && (
        <span className="text-ink-2">
          dismissed {formatMoment(upload.dismissed.at, timeZone)} by {upload.dismissed.byName}
        </span>
      )}
      {upload.state !== 'receiving' && <OriginalLink upload={upload} />}
      <Button look="word" busy={busy} onClick={() => takeBack(upload.version)}>
        Take back <span className="sr-only">{upload.fileName}</span>
      </Button>
      <FormError error={error} />
    </li>
  )
}
