import { zodResolver } from '@hookform/resolvers/zod'
import { Controller, useForm } from 'react-hook-form'
import type { z } from 'zod'
import { SessionForm as SessionSchema } from '../../../shared/contracts/sessions.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { Protocol, protocolNames } from '../../../shared/contracts/tests.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { SelectField, TextAreaField, TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { LeaveGuard } from '../../components/leave-guard.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { SquadTicks } from './squad-ticks.tsx'

export type SessionValues = z.infer<typeof SessionSchema>

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
  protocol: 'Test',
  squadIds: 'Squads',
  note: 'Note',
}
const orNull = (typed: string | null) => typed?.trim() || null

/** A new session: when, where, what is tested, with whom. */
export function SessionForm({ values, squads, onSave }: Props) {
  const form = useForm({ resolver: zodResolver(SessionSchema), defaultValues: values })
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
      <TextField
        label={labels.title}
        error={errors.title?.message}
        autoComplete="off"
        {...form.register('title')}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField label={labels.date} type="date" error={errors.date?.message} {...form.register('date')} />
        <TextField
          label="Place (may be left empty)"
          autoComplete="off"
          error={errors.place?.message}
          {...form.register('place', { setValueAs: orNull })}
        />
      </div>
      <SelectField label={labels.protocol} error={errors.protocol?.message} {...form.register('protocol')}>
        {Protocol.options.map((protocol) => (
          <option key={protocol} value={protocol}>
            {protocolNames[protocol]}
          </option>
        ))}
      </SelectField>
      <Controller
        control={form.control}
        name="squadIds"
        render={({ field }) => (
          <SquadTicks
            hint="Their athletes stand on the sheet from the start."
            squads={squads}
            chosen={field.value}
            onChange={field.onChange}
            error={errors.squadIds?.message}
          />
        )}
      />
      <TextAreaField
        label="Note (may be left empty)"
        error={errors.note?.message}
        {...form.register('note', { setValueAs: orNull })}
      />
      <Button type="submit" look="main" className="self-start" busy={isSubmitting}>
        Make the session
      </Button>
    </form>
  )
}
