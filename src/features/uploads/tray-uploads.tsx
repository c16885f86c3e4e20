import { useRef } from 'react'
import { Link } from 'react-router-dom'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { useMe } from '../../api/account/get-me.ts'
import { Button } from '../../components/button.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Tag } from '../../components/tag.tsx'
import { focusNextRow } from '../../lib/focus-next-row.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { arrivedPercent } from './chunk-plan.ts'
import { OriginalLink } from './original-link.tsx'
import { useDismissUpload } from './use-dismiss-upload.ts'

/** Files of the session that need a person: refused, here already, without a trial, or stopped half-way. */
export function needsPerson(upload: Upload): boolean {
  if (upload.dismissed || upload.arriving) return false
  if (upload.state === 'read') return upload.trials === 0
  return upload.state !== 'waiting' && upload.state !== 'unpacked'
}

/** A file in the Tray: what was found, what to do, and a way to clear it away. */
export function TrayUpload({ upload }: { upload: Upload }) {
  const row = useRef<HTMLLIElement>(null)
  const { dismiss, busy, error } = useDismissUpload(upload, () => focusNextRow(row.current))
  return (
    <li ref={row} className="flex flex-col gap-0.5 border-b border-rule-2 py-1.5 text-small">
      <p className="flex flex-wrap items-baseline gap-x-2">
        <span className="font-semibold break-all">{upload.fileName}</span> <StateTag upload={upload} />
        <Button look="word" className="ms-auto" busy={busy} onClick={dismiss}>
          Dismiss <span className="sr-only">{upload.fileName}</span>
        </Button>
      </p>
      <Explanation upload={upload} />
      <FormError error={error} />
    </li>
  )
}

function StateTag({ upload }: { upload: Upload }) {
  if (upload.state === 'refused') return <Tag tone="stop">could not be read</Tag>
  if (upload.state === 'duplicate') return <Tag>here already</Tag>
  if (upload.state === 'receiving') return <Tag tone="caution">not all here</Tag>
  return <Tag tone="caution">no trial found</Tag>
}

function Explanation({ upload }: { upload: Upload }) {
  const { error, duplicateOf } = upload
  if (error) {
    return (
      <p>
        {error.sentence} <Place error={error} />
        <span className="text-ink-2">{error.remedy}</span> <OriginalLink upload={upload} />
      </p>
    )
  }
  if (duplicateOf) {
    const here = duplicateOf.sessionId === upload.sessionId
    return (
      <p>
        The same recording as {duplicateOf.fileName}
        {here ? ' in this session' : ''}; it is kept once, there.{' '}
        {!here && <Link to={pathOf.session(duplicateOf.sessionId)}>Open the session that has it</Link>}
      </p>
    )
  }
  if (upload.state === 'receiving') {
    return (
      <p>
        <Stopped upload={upload} /> Add the same file again to send the rest.
      </p>
    )
  }
  return (
    <p>
      {upload.notes.map((note) => note.sentence).join(' ')} <OriginalLink upload={upload} />
    </p>
  )
}

function Stopped({ upload }: { upload: Upload }) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  return (
    <>
      Stopped at {arrivedPercent(upload)} %, {formatMoment(upload.lastReceivedAt, timeZone)}; sent by{' '}
      {upload.uploadedByName}.
    </>
  )
}

function Place({ error }: { error: NonNullable<Upload['error']> }) {
  const parts = [
    error.line !== undefined ? `line ${error.line}` : '',
    error.column !== undefined ? `column ${error.column}` : '',
    error.seen !== undefined && !error.sentence.includes(error.seen) ? `“${error.seen}”` : '',
  ].filter(Boolean)
  return parts.length === 0 ? null : <span className="text-ink-2">({parts.join(', ')}) </span>
}

/** Files that other pages are sending this moment: somebody is at it, and nothing is to be done here. */
export function ArrivingUploads({ uploads }: { uploads: readonly Upload[] }) {
  if (uploads.length === 0) return null
  return (
    <ul aria-label="Files that others send" className="border-t border-rule text-small">
      {uploads.map((upload) => (
        <li key={upload.id} className="py-1">
          <span className="font-semibold break-all">{upload.fileName}</span>{' '}
          <span className="text-ink-2">
            {upload.uploadedByName} is sending it now, {arrivedPercent(upload)} % here
          </span>
        </li>
      ))}
    </ul>
  )
}
