import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { SessionForm as SessionSchema } from '../../../shared/contracts/sessions.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { FormError } from '../../components/form-error.tsx'
import { LeaveGuard } from '../../components/leave-guard.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { SessionFields } from './session-fields.tsx'
import type { SessionValues } from './session-values.ts'

interface Props {
  values: SessionValues
  /** Those that may be tested. */
  squads: Squad[]
  /** Rejects with what the server refused. */
  onSave: (values: SessionValues) => Promise<void>
}

const labels = {
  title: 'Title',
  date: 'Date',
  place: 'Place',
  test: 'Test',
  squadIds: 'Squads',
  note: 'Note',
}

/** A new session. */
export function SessionForm({ values, squads, onSave }: Props) {
  const form = useForm<SessionValues>({ resolver: zodResolver(SessionSchema), defaultValues: values })
  const { errors, isSubmitting, isDirty, isSubmitSuccessful } = form.formState
  const [refusal, setRefusal] = useFormError()
  const submit = form.handleSubmit(async (next) => {
    setRefusal(null)
    try {
      await onSave(next)
    } catch (error) {
      setRefusal(placeFieldErrors(form, error))
      throw error
    }
  })
  return (
    <form
      noValidate
      className="flex max-w-2xl flex-col gap-4"
      onSubmit={(event) => void submit(event).catch(() => {})}
    >
      <LeaveGuard dirty={isDirty && !isSubmitting && !isSubmitSuccessful} />
      <FormError error={refusal} />
      <ErrorSummary errors={errors} labels={labels} />
      <SessionFields
        form={form}
        squads={squads}
        squadsHint="Their athletes stand on the sheet from the start."
      />
      <Button type="submit" look="main" className="self-start" busy={isSubmitting}>
        Make the session
      </Button>
    </form>
  )
}
