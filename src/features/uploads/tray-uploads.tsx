import { Link } from 'react-router-dom'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { originalAddress } from '../../api/uploads/original-address.ts'
import { Tag } from '../../components/tag.tsx'
import { pathOf } from '../../lib/paths.ts'

/** Files of the session that need a person: refused, here already, without a trial, or not all here. */
export function needsPerson(upload: Upload): boolean {
  if (upload.state === 'read') return upload.trials === 0
  return upload.state !== 'waiting'
}

/** A file in the Tray: what was found, what to do. */
export function TrayUpload({ upload }: { upload: Upload }) {
  return (
    <li className="flex flex-col gap-0.5 border-b border-rule-2 py-1.5 text-small">
      <p>
        <span className="font-semibold break-all">{upload.fileName}</span> <StateTag upload={upload} />
      </p>
      <Explanation upload={upload} />
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
        <span className="text-ink-2">{error.remedy}</span> <Original upload={upload} />
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
    const parts = Math.ceil(upload.sizeBytes / limits.chunkBytes)
    return (
      <p>
        {upload.chunksReceived.length} of {parts} parts arrived. Add the same file again to send the rest.
      </p>
    )
  }
  return (
    <p>
      {upload.notes.map((note) => note.sentence).join(' ')} <Original upload={upload} />
    </p>
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

/** The file as it came is kept, whatever became of it. */
function Original({ upload }: { upload: Upload }) {
  return (
    <a href={originalAddress(upload.id)} download>
      Download the original <span className="sr-only">of {upload.fileName}</span>
    </a>
  )
}
