import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { SessionForm, type SessionSheet } from '../../../shared/contracts/sessions.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeSession } from '../../api/sessions/change-session.ts'
import { useSquads } from '../../api/squads/list-squads.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { FormError } from '../../components/form-error.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { SessionFields } from './session-fields.tsx'
import type { SessionValues } from './session-values.ts'

interface Props {
  session: SessionSheet['session']
  onClose: () => void
}

/** All that was said of a session when it was made. */
export function EditSessionDialog({ session, onClose }: Props) {
  const squads = useSquads()
  const { title, date, place, note, test, squadIds } = session
  const form = useForm<SessionValues>({
    resolver: zodResolver(SessionForm),
    defaultValues: { title, date, place, note, test, squadIds },
  })
  return (
    <Dialog title="Edit the session" onClose={onClose} dirty={form.formState.isDirty}>
      <QueryState query={squads} what="the squads">
        {(all) => (
          <EditForm
            session={session}
            form={form}
            squads={all.filter(({ id, archived }) => !archived || squadIds.includes(id))}
            onClose={onClose}
          />
        )}
      </QueryState>
    </Dialog>
  )
}

function EditForm({
  session,
  form,
  squads,
  onClose,
}: Props & { form: ReturnType<typeof useForm<SessionValues>>; squads: Squad[] }) {
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
    <form noValidate className="flex flex-col gap-4" onSubmit={(event) => void submit(event)}>
      <FormError error={change.error} />
      <SessionFields
        form={form}
        squads={squads}
        squadsHint="Athletes of a squad that you take out leave the sheet, unless they have trials on it."
        {...(session.trials > 0 && {
          testHint:
            'With another test the trials of this session are analysed anew. What is published stays until you publish again.',
        })}
      />
      <Button
        type="submit"
        look="main"
        className="self-start"
        busy={change.isPending}
        disabled={!form.formState.isDirty}
      >
        Save
      </Button>
    </form>
  )
}
