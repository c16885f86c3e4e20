import { zodResolver } from '@hookform/resolvers/zod'
import { useState, type ReactNode } from 'react'
import { Controller, useForm } from 'react-hook-form'
import type { z } from 'zod'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { createSquad } from '../../../shared/contracts/squads.ts'
import { Button } from '../../components/button.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { MemberPicker } from './member-picker.tsx'

export type SquadValues = z.infer<typeof createSquad.body>

interface SquadFormProps {
  values: SquadValues
  athletes: Athlete[]
  act: string
  onDirty: (dirty: boolean) => void
  /** Rejects with what the server refused. */
  onSave: (values: SquadValues) => Promise<void>
  notice?: ReactNode
}

/** A squad's name and members, for a new one and for one being changed. */
export function SquadForm({ values, athletes, act, onDirty, onSave, notice }: SquadFormProps) {
  const form = useForm({ resolver: zodResolver(createSquad.body), defaultValues: values })
  const { errors, isSubmitting, isDirty } = form.formState
  const [refusal, setRefusal] = useFormError()
  const [search, setSearch] = useState('')

  const submit = form.handleSubmit(async (next) => {
    setRefusal(null)
    try {
      await onSave(next)
    } catch (error) {
      setRefusal(placeFieldErrors(form, error, { fieldOf: { 'name-taken': 'name' } }))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      {notice}
      <FormError error={refusal} />
      <TextField
        label="Name"
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', { onChange: () => onDirty(true) })}
      />
      <Controller
        control={form.control}
        name="athleteIds"
        render={({ field }) => (
          <MemberPicker
            athletes={athletes}
            search={search}
            onSearch={setSearch}
            chosen={field.value}
            onChange={(ids) => {
              onDirty(true)
              field.onChange(ids)
            }}
          />
        )}
      />
      <Button type="submit" look="main" className="self-start" busy={isSubmitting} disabled={!isDirty}>
        {act}
      </Button>
    </form>
  )
}
