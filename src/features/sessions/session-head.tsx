import type { ReactNode } from 'react'
import type { SessionSheet } from '../../../shared/contracts/sessions.ts'
import { useMe } from '../../api/account/get-me.ts'
import { Button } from '../../components/button.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { counted } from '../../lib/counted.ts'
import { formatDate, formatMoment } from '../../lib/format-date.ts'
import { testWords } from '../../lib/test-words.ts'
import type { SheetCounts } from './sheet-rows.ts'

interface Props {
  sheet: SessionSheet
  counts: SheetCounts
  addFiles: ReactNode
  onEdit: () => void
  onPublish: () => void
}

export function SessionHead({
  sheet: { session, changedSincePublished },
  counts,
  addFiles,
  onEdit,
  onPublish,
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
      <PublishedLine session={session} changed={changedSincePublished} />
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

function PublishedLine({ session, changed }: { session: SessionSheet['session']; changed: boolean }) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  if (session.publishedAt === null) return null
  return (
    <p className="pb-3 text-small text-ink-2">
      Published {formatMoment(session.publishedAt, timeZone)}
      {session.publishedByName !== null && ` by ${session.publishedByName}`}.{' '}
      {changed && 'What athletes read is older than this sheet: publish again to show them this one.'}
    </p>
  )
}
