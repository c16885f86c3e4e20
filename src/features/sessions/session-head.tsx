import { useEffect, useRef, type ReactNode } from 'react'
import type { SessionSheet } from '../../../shared/contracts/sessions.ts'
import { useMe } from '../../api/account/get-me.ts'
import { sessionArchiveAddress } from '../../api/downloads/download-addresses.ts'
import { Button } from '../../components/button.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { counted } from '../../lib/counted.ts'
import { formatDate, formatMoment } from '../../lib/format-date.ts'
import { testWords } from '../../lib/test-words.ts'
import { RecomputeEntry } from '../recomputes/recompute-entry.tsx'
import type { SheetCounts } from './sheet-rows.ts'

interface Props {
  sheet: SessionSheet
  counts: SheetCounts
  addFiles: ReactNode
  onEdit: () => void
  onPublish: () => void
  /** How often it was published on this page: each time the focus goes to the line that says so. */
  publications: number
}

export function SessionHead({
  sheet: { session, changedSincePublished },
  counts,
  addFiles,
  onEdit,
  onPublish,
  publications,
}: Props) {
  const context = [
    formatDate(session.date),
    session.place,
    session.squadNames.join(', '),
    testWords(session.test),
  ]
  return (
    <>
      <PageHead
        title={session.title}
        context={context.filter(Boolean).join(' · ')}
        actions={
          <>
            <span className="text-ink-2">
              {counted(counts.trials, 'trial')}, {counts.setAside} set aside
            </span>
            <Button onClick={onEdit}>Edit</Button>
            <a className="button" href={sessionArchiveAddress(session.id)} download>
              Download
            </a>
            <RecomputeEntry scope={{ kind: 'session', sessionId: session.id }} of={session.title} />
            {addFiles}
            <PublishButton
              session={session}
              changed={changedSincePublished}
              counts={counts}
              onPublish={onPublish}
            />
          </>
        }
      />
      {session.note !== null && <p className="max-w-prose pb-3">{session.note}</p>}
      <PublishedLine session={session} changed={changedSincePublished} publications={publications} />
    </>
  )
}

interface PublishButtonProps {
  session: SessionSheet['session']
  changed: boolean
  counts: SheetCounts
  onPublish: () => void
}

function PublishButton({ session, changed, counts, onPublish }: PublishButtonProps) {
  if (session.publishedAt !== null && !changed) return null
  const { athletes } = counts.toPublish
  const act = session.publishedAt === null ? 'Publish' : 'Publish again'
  return (
    <Button look="main" disabled={athletes === 0} onClick={onPublish}>
      {athletes === 0 ? act : `${act} to ${counted(athletes, 'athlete')}`}
    </Button>
  )
}

interface PublishedLineProps {
  session: SessionSheet['session']
  changed: boolean
  publications: number
}

function PublishedLine({ session, changed, publications }: PublishedLineProps) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const line = useRef<HTMLParagraphElement>(null)
  const isPublished = session.publishedAt !== null
  // The button that had the focus is gone with the act.
  useEffect(() => {
    if (publications > 0) line.current?.focus()
  }, [publications, isPublished])
  if (session.publishedAt === null) return null
  return (
    <p ref={line} tabIndex={-1} className="pb-3 text-small text-ink-2">
      Published {formatMoment(session.publishedAt, timeZone)}
      {session.publishedByName !== null && ` by ${session.publishedByName}`}.{' '}
      {changed && 'What athletes read is older than this sheet: publish again to show them this one.'}
    </p>
  )
}
