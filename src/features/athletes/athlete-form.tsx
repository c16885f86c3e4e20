import { zodResolver } from '@hookform/resolvers/zod'
import type { ReactNode } from 'react'
import { Controller, useForm } from 'react-hook-form'
import type { z } from 'zod'
import { AthleteForm as AthleteSchema } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { TickList } from '../../components/tick-list.tsx'
import { parseDecimal } from '../../lib/parse-decimal.ts'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

export type AthleteValues = z.infer<typeof AthleteSchema>

interface AthleteFormProps {
  values: AthleteValues
  squads: Squad[]
  act: string
  onDirty: (dirty: boolean) => void
  /** Rejects with what the server refused. */
  onSave: (values: AthleteValues) => Promise<void>
  /** Stands over the fields: what somebody else changed meanwhile. */
  notice?: ReactNode
}

/** The fields of an athlete's record, for a new one and for one being changed. */
export function AthleteForm({ values, squads, act, onDirty, onSave, notice }: AthleteFormProps) {
  const form = useForm({ resolver: zodResolver(AthleteSchema), defaultValues: values })
  const { errors, isSubmitting, isDirty } = form.formState
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (next) => {
    setRefusal(null)
    try {
      await onSave(next)
    } catch (error) {
      setRefusal(placeFieldErrors(form, error, { fieldOf: { 'name-taken': 'name' } }))
    }
  })

  return (
    <form noValidate onSubmit={submit} onChange={() => onDirty(true)} className="flex flex-col gap-4">
      {notice}
      <FormError error={refusal} />
      <ErrorSummary
        errors={errors}
        labels={{ name: 'Name', bornOn: 'Born on', recordedMassKg: 'Recorded mass', squadIds: 'Squads' }}
      />
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField
          label="Born on (may be left empty)"
          type="date"
          error={errors.bornOn?.message}
          {...form.register('bornOn', { setValueAs: (typed: string | null) => typed || null })}
        />
        <TextField
          label="Recorded mass, kg (may be left empty)"
          inputMode="decimal"
          autoComplete="off"
          error={errors.recordedMassKg?.message}
          {...form.register('recordedMassKg', { setValueAs: parseDecimal })}
        />
      </div>
      <Controller
        control={form.control}
        name="squadIds"
        render={({ field }) => (
          <TickList
            label="Squads"
            items={squads.map(({ id, name }) => ({ id, words: name }))}
            none="The club has no squads yet; an athlete can join one later."
            chosen={field.value}
            onChange={field.onChange}
            error={errors.squadIds?.message}
          />
        )}
      />
      <Button type="submit" look="main" className="self-start" busy={isSubmitting} disabled={!isDirty}>
        {act}
      </Button>
    </form>
  )
}
