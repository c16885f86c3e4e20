import type { SessionSheet } from '../../../shared/contracts/sessions.ts'
import { usePublishSession } from '../../api/sessions/publish-session.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { FormError } from '../../components/form-error.tsx'
import { counted } from '../../lib/counted.ts'
import { metricInSentence } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'
import type { SheetCounts } from './sheet-rows.ts'

interface Props {
  session: SessionSheet['session']
  counts: SheetCounts
  onClose: () => void
  /** Closes as well. */
  onPublished: () => void
}

/** Says what athletes will see and what stays out, then publishes. */
export function PublishDialog({ session, counts, onClose, onPublished }: Props) {
  const announce = useAnnounce()
  const publish = usePublishSession((published) => {
    announce({
      text: `Published ${counted(published.trialsPublished, 'trial')} to ${counted(published.athletesPublished, 'athlete')}.`,
    })
    onPublished()
  })
  const { athletes, trials } = counts.toPublish
  const again = session.publishedAt !== null
  return (
    <Dialog
      title={`${again ? 'Publish again' : 'Publish'} to ${counted(athletes, 'athlete')}?`}
      onClose={onClose}
    >
      <div className="flex flex-col gap-4">
        <p>
          {counted(athletes, 'athlete')} will see {athletes === 1 ? 'their' : 'their own'} results of{' '}
          {counted(trials, 'trial')}: {shownWords(session.test.protocol)} Nobody sees another’s.
        </p>
        <StaysOut counts={counts} />
        <p className="text-ink-2">
          {again
            ? 'Athletes have read the earlier publication until now; from this moment they read this one.'
            : 'What they see stays as it is now until you publish again.'}
        </p>
        <FormError error={publish.error} />
        <div className="flex flex-wrap gap-3">
          <Button
            look="main"
            busy={publish.isPending}
            onClick={() =>
              publish.mutate({ params: { sessionId: session.id }, body: { version: session.version } })
            }
          >
            {again ? 'Publish again' : 'Publish'}
          </Button>
          <Button onClick={onClose}>Not yet</Button>
        </div>
      </div>
    </Dialog>
  )
}

/** The figure that stands for the test, the landing where that is another figure, and the traces. */
function shownWords(protocol: SessionSheet['session']['test']['protocol']): string {
  const headline = metricInSentence(headlineMetric(protocol))
  return protocol === 'dropLanding'
    ? `${headline} and each trial’s trace.`
    : `${headline}, landing, and each trial’s trace.`
}

function StaysOut({ counts: { setAside, inTray, unanalysed } }: { counts: SheetCounts }) {
  const parts = [
    setAside > 0 ? `${counted(setAside, 'trial')} set aside` : '',
    inTray > 0 ? `${counted(inTray, 'trial')} in the Tray` : '',
    unanalysed > 0 ? `${counted(unanalysed, 'trial')} still being analysed` : '',
  ].filter(Boolean)
  return parts.length === 0 ? null : <p>Stays out: {parts.join(', ')}.</p>
}
