import { useState, type ReactNode } from 'react'
import type { SessionSheet as Sheet } from '../../../shared/contracts/sessions.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { EmptyState } from '../../components/empty-state.tsx'
import { sheetColumnsOf } from '../results/test-metrics.ts'
import { MoveTrialDialog } from '../trials/move-trial-dialog.tsx'
import { SetAsideDialog } from '../trials/set-aside-dialog.tsx'
import type { ActedTrial } from '../trials/use-trial-acts.ts'
import type { QueuedFile, UploadQueue } from '../uploads/upload-queue.ts'
import { EditSessionDialog } from './edit-session-dialog.tsx'
import { PublishDialog } from './publish-dialog.tsx'
import { SessionHead } from './session-head.tsx'
import { sheetCounts, sheetRows } from './sheet-rows.ts'
import { SheetTable } from './sheet-table.tsx'
import { Tray } from './tray.tsx'

interface Props {
  sheet: Sheet
  files: readonly QueuedFile[]
  queue: UploadQueue
  addFiles: ReactNode
}

type Open = { dialog: 'publish' | 'edit' } | { dialog: 'set-aside' | 'move'; trial: ActedTrial } | null

/** The Session sheet: head, Tray, table, and the dialogs that act on them. */
export function SessionSheet({ sheet, files, queue, addFiles }: Props) {
  const [open, setOpen] = useState<Open>(null)
  const close = () => setOpen(null)
  const [publications, setPublications] = useState(0)
  const closePublished = () => {
    close()
    setPublications((n) => n + 1)
  }
  const { rows, columns, tray } = sheetRows(sheet)
  const counts = sheetCounts(sheet)
  return (
    <>
      <SessionHead
        sheet={sheet}
        counts={counts}
        addFiles={addFiles}
        onEdit={() => setOpen({ dialog: 'edit' })}
        onPublish={() => setOpen({ dialog: 'publish' })}
        publications={publications}
      />
      <Tray trials={tray} uploads={sheet.uploads} athletes={sheet.athletes} files={files} queue={queue} />
      {rows.length === 0 ? (
        <EmptyState title="The squads of this session have no athletes yet">
          Put athletes into the squad: they stand here then, and recordings find them by name.
        </EmptyState>
      ) : (
        <SheetTable
          caption={`${sheet.session.title}, athletes and trials`}
          metrics={sheetColumnsOf(sheet.session.test.protocol)}
          rows={rows}
          columns={columns}
          acts={{
            setAside: (trial) => setOpen({ dialog: 'set-aside', trial }),
            move: (trial) => setOpen({ dialog: 'move', trial }),
          }}
        />
      )}
      {sheet.trials.length > 0 && <SheetFoot />}
      {open?.dialog === 'publish' && (
        <PublishDialog session={sheet.session} counts={counts} onClose={close} onPublished={closePublished} />
      )}
      {open?.dialog === 'edit' && <EditSessionDialog session={sheet.session} onClose={close} />}
      {open?.dialog === 'set-aside' && <SetAsideDialog trial={open.trial} onClose={close} />}
      {open?.dialog === 'move' && (
        <MoveTrialDialog trial={open.trial} athletes={sheet.athletes} onClose={close} />
      )}
    </>
  )
}

function SheetFoot() {
  return (
    <div className="flex flex-col gap-1 py-3">
      <p className="no-print hidden text-small text-ink-2 md:block">
        In the table: arrow keys move from trial to trial, Enter opens one, <kbd>x</kbd> sets it aside or
        takes it back, <kbd>m</kbd> moves it to another athlete.
      </p>
      <p className="text-small text-ink-2">
        ± is how sure the figure is, for about 95 %: of a trial, what the plate and the weighing say; of a
        mean, the larger of that and what trials differ by from one to the next. How much an athlete differs
        from day to day is not in it.
      </p>
      <CautionLine />
    </div>
  )
}
