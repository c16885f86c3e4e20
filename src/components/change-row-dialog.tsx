import { Fragment, useState, type ReactNode } from 'react'
import type { z } from 'zod'
import { changedValues } from '../lib/changed-values.ts'
import { useStaleRow } from '../lib/use-stale-row.ts'
import { useAnnounce } from './announcer.tsx'
import { Dialog } from './dialog.tsx'
import { StaleNotice, type StaleField } from './stale-notice.tsx'

interface NamedRow {
  id: string
  name: string
  version: number
}

/** What the form inside needs: what it starts from, and whom to tell. */
export interface ChangeForm<Values> {
  values: Values
  onDirty: (dirty: boolean) => void
  /** Rejects with what the server refused, but for a version that is stale: that is told in `notice`. */
  onSave: (values: Values) => Promise<void>
  /** What somebody else changed meanwhile. */
  notice: ReactNode
}

interface Props<Row extends NamedRow, Values extends object> {
  row: Row
  schema: z.ZodType<Row>
  valuesOf: (row: Row) => Values
  /** The row's fields in words, for showing what somebody else changed. */
  staleFields: StaleField<Row>[]
  /** Saves what was changed, over that version. */
  save: (id: string, body: { version: number } & Partial<Values>) => Promise<Row>
  busy: boolean
  onClose: () => void
  children: (form: ChangeForm<Values>) => ReactNode
}

/** Changes a named row in a form, and lets the person decide where somebody else saved first. */
export function ChangeRowDialog<Row extends NamedRow, Values extends object>(props: Props<Row, Values>) {
  const { row, schema, valuesOf, staleFields, save, busy, onClose, children } = props
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  const { opened, newer, version, catchStale, takeTheirs } = useStaleRow(row, schema)

  const onSave = async (values: Values) => {
    try {
      const saved = await save(opened.id, { version, ...changedValues(valuesOf(opened), values) })
      announce({ text: `${saved.name} is saved.` })
      onClose()
    } catch (error) {
      catchStale(error)
    }
  }
  const notice = (
    <StaleNotice
      opened={opened}
      newer={newer}
      fields={staleFields}
      busy={busy}
      onTakeTheirs={() => {
        takeTheirs()
        setDirty(false)
      }}
    />
  )
  return (
    <Dialog title={`Change ${opened.name}`} onClose={onClose} dirty={dirty}>
      <Fragment key={opened.version}>
        {children({ values: valuesOf(opened), onDirty: setDirty, onSave, notice })}
      </Fragment>
    </Dialog>
  )
}
