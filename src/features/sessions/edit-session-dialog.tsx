import { zodResolver } from '@hookform/resolvers/zod'
import { Controller, useForm } from 'react-hook-form'
import { SessionForm, type SessionSheet } from '../../../shared/contracts/sessions.ts'
import { useChangeSession } from '../../api/sessions/change-session.ts'
import { useSquads } from '../../api/squads/list-squads.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { TextAreaField, TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { SquadTicks } from './squad-ticks.tsx'

const EditForm = SessionForm.omit({ protocol: true })
const orNull = (typed: string | null) => typed?.trim() || null

/** Date, title, place, squads and note of a session. */
export function EditSessionDialog({
  session,
  onClose,
}: {
  session: SessionSheet['session']
  onClose: () => void
}) {
  const { title, date, place, note, squadIds } = session
  const form = useForm({
    resolver: zodResolver(EditForm),
    defaultValues: { title, date, place, note, squadIds },
  })
  const squads = useSquads()
  const { errors, isDirty } = form.formState
  const announce = useAnnounce()
  const change = useChangeSession(() => {
    announce({ text: 'Session saved.' })
    onClose()
  })
  const submit = form.handleSubmit((values) =>
    change.mutate(
      { params: { sessionId: session.id }, body: { ...values, version: session.version } },
      { onError: (error) => void placeFieldErrors(form, error) },
    ),
  )
  return (
    <Dialog title="Edit the session" onClose={onClose} dirty={isDirty}>
      <form noValidate className="flex flex-col gap-4" onSubmit={(event) => void submit(event)}>
        <FormError error={change.error} />
        <TextField
          label="Title"
          autoComplete="off"
          error={errors.title?.message}
          {...form.register('title')}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField label="Date" type="date" error={errors.date?.message} {...form.register('date')} />
          <TextField
            label="Place (may be left empty)"
            autoComplete="off"
            error={errors.place?.message}
            {...form.register('place', { setValueAs: orNull })}
          />
        </div>
        <QueryState query={squads} what="the squads">
          {(all) => (
            <Controller
              control={form.control}
              name="squadIds"
              render={({ field }) => (
                <SquadTicks
                  hint="Athletes of a squad that you take out leave the sheet, unless they have trials on it."
                  squads={all.filter(({ id, archived }) => !archived || squadIds.includes(id))}
                  chosen={field.value}
                  onChange={field.onChange}
                  error={errors.squadIds?.message}
                />
              )}
            />
          )}
        </QueryState>
        <TextAreaField
          label="Note (may be left empty)"
          error={errors.note?.message}
          {...form.register('note', { setValueAs: orNull })}
        />
        <Button type="submit" look="main" className="self-start" busy={change.isPending} disabled={!isDirty}>
          Save
        </Button>
      </form>
    </Dialog>
  )
}
