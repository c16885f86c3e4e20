import { Button } from './button.tsx'
import { Notice } from './notice.tsx'

export interface StaleField<Row> {
  label: string
  /** The field's value in words. */
  show: (row: Row) => string
}

interface StaleNoticeProps<Row> {
  /** As it was when the form was opened. */
  opened: Row
  /** As it stands now; null while nobody else saved. */
  newer: Row | null
  fields: StaleField<Row>[]
  busy: boolean
  onTakeTheirs: () => void
}

/**
 * Somebody else saved first: shows what they changed and lets the person decide. Stands inside the form, which then
 * saves over the version shown here; nothing is overwritten unseen.
 */
export function StaleNotice<Row>({ opened, newer, fields, busy, onTakeTheirs }: StaleNoticeProps<Row>) {
  if (newer === null) return null
  const changed = fields.filter(({ show }) => show(opened) !== show(newer))
  return (
    <Notice tone="caution" role="alert" title="Somebody changed this while you had it open">
      {changed.length === 0 ? (
        <p>Nothing that stands in this form was changed.</p>
      ) : (
        <ul className="list-disc ps-5">
          {changed.map(({ label, show }) => (
            <li key={label}>
              {label}: was {show(opened)}, is now {show(newer)}
            </li>
          ))}
        </ul>
      )}
      <p>Nothing of yours was saved yet. Saving now changes only what you changed here.</p>
      <div className="flex flex-wrap gap-x-4">
        <Button type="submit" look="word" className="text-ink" busy={busy}>
          Save mine over it
        </Button>
        <Button look="word" className="text-ink" onClick={onTakeTheirs}>
          Drop mine, take theirs
        </Button>
      </div>
    </Notice>
  )
}
