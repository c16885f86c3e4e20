import { zodResolver } from '@hookform/resolvers/zod'
import { Controller, useForm, useWatch } from 'react-hook-form'
import type { z } from 'zod'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { SelectField, TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { compareText } from '../../lib/sort-rows.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { InviteSchema } from './invite-schema.ts'
import { RolePicker } from './role-picker.tsx'

type InviteValues = z.output<typeof InviteSchema>

interface InviteFormProps {
  athletes: Athlete[]
  onDirty: () => void
  /** Rejects with what the server refused. */
  onInvite: (values: InviteValues) => Promise<void>
}

const fieldOf = {
  'email-taken': 'email',
  'already-invited': 'email',
  'athlete-already-linked': 'athleteId',
} as const

export function InviteForm({ athletes, onDirty, onInvite }: InviteFormProps) {
  const form = useForm({
    resolver: zodResolver(InviteSchema),
    defaultValues: { name: '', email: '', roles: [], athleteId: null },
  })
  const { errors, isSubmitting } = form.formState
  const isAthlete = useWatch({ control: form.control, name: 'roles' }).includes('athlete')
  const [refusal, setRefusal] = useFormError()
  const free = athletes
    .filter(({ linked, archived }) => !linked && !archived)
    .sort((a, b) => compareText(a.name, b.name))

  const submit = form.handleSubmit(async (values) => {
    setRefusal(null)
    try {
      await onInvite({ ...values, athleteId: isAthlete ? values.athleteId : null })
    } catch (error) {
      setRefusal(placeFieldErrors(form, error, { fieldOf }))
    }
  })

  return (
    <form noValidate onSubmit={submit} onChange={onDirty} className="flex flex-col gap-4">
      <p>
        They get a mail with a link that works for {limits.invitationDays} days, and choose a password of
        their own.
      </p>
      <FormError error={refusal} />
      <ErrorSummary
        errors={errors}
        labels={{ name: 'Name', email: 'E-mail address', roles: 'Roles', athleteId: 'Athlete’s record' }}
      />
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <Controller
        control={form.control}
        name="roles"
        render={({ field }) => (
          <RolePicker chosen={field.value} onChange={field.onChange} error={errors.roles?.message} />
        )}
      />
      {isAthlete && (
        <SelectField
          label="Athlete’s record"
          hint={
            free.length === 0
              ? 'Every active athlete has a sign-in already; add the athlete to the roster first.'
              : 'Whose results they see. Only athletes without a sign-in are listed.'
          }
          error={errors.athleteId?.message}
          {...form.register('athleteId', { setValueAs: (id: string | null) => id || null })}
        >
          <option value="">Choose…</option>
          {free.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </SelectField>
      )}
      <Button type="submit" look="main" className="self-start" busy={isSubmitting}>
        Send the invitation
      </Button>
    </form>
  )
}
