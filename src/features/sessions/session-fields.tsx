import { Controller, type UseFormReturn } from 'react-hook-form'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { TextAreaField, TextField } from '../../components/field.tsx'
import { SquadTicks } from './squad-ticks.tsx'
import { orNull, type SessionValues } from './session-values.ts'
import { TestFields } from './test-fields.tsx'

interface Props {
  form: UseFormReturn<SessionValues>
  squads: readonly Squad[]
  squadsHint: string
  /** Said of the test where changing it has consequences. */
  testHint?: string
}

/** When, where, what is tested, with whom: the fields of a session, for a new one and for one being changed. */
export function SessionFields({ form, squads, squadsHint, testHint }: Props) {
  const { errors } = form.formState
  return (
    <>
      <TextField label="Title" error={errors.title?.message} autoComplete="off" {...form.register('title')} />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField label="Date" type="date" error={errors.date?.message} {...form.register('date')} />
        <TextField
          label="Place (may be left empty)"
          autoComplete="off"
          error={errors.place?.message}
          {...form.register('place', { setValueAs: orNull })}
        />
      </div>
      <TestFields form={form} />
      {testHint !== undefined && <p className="text-small text-ink-2">{testHint}</p>}
      <Controller
        control={form.control}
        name="squadIds"
        render={({ field }) => (
          <SquadTicks
            hint={squadsHint}
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
    </>
  )
}
