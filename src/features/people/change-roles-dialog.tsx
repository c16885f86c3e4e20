import { zodResolver } from '@hookform/resolvers/zod'
import { Controller, useForm } from 'react-hook-form'
import { z } from 'zod'
import { InviteForm, Person } from '../../../shared/contracts/people.ts'
import type { Role } from '../../../shared/contracts/roles.ts'
import { useMe } from '../../api/account/get-me.ts'
import { useChangePerson } from '../../api/people/change-person.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { FormError } from '../../components/form-error.tsx'
import { StaleNotice, type StaleField } from '../../components/stale-notice.tsx'
import { roleNames } from '../../lib/role-names.ts'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { RolePicker } from './role-picker.tsx'

const RolesSchema = z.strictObject({ roles: InviteForm.shape.roles })

const staleFields: StaleField<Person>[] = [
  { label: 'Roles', show: ({ roles }) => roles.map((role) => roleNames[role]).join(', ') },
  { label: 'Active', show: ({ active }) => (active ? 'yes' : 'no') },
]

export function ChangeRolesDialog({ person, onClose }: { person: Person; onClose: () => void }) {
  const change = useChangePerson()
  const announce = useAnnounce()
  const isOneself = useMe().data?.person.id === person.id
  const { opened, newer, version, catchStale, takeTheirs } = useStaleRow(person, Person)
  const form = useForm<{ roles: Role[] }>({
    resolver: zodResolver(RolesSchema),
    defaultValues: { roles: opened.roles },
  })
  const { errors, isDirty } = form.formState
  const [refusal, setRefusal] = useFormError()

  const save = form.handleSubmit(async ({ roles }) => {
    setRefusal(null)
    try {
      await change.mutateAsync({ params: { personId: opened.id }, body: { version, roles } })
      announce({ text: isOneself ? 'Your roles are saved.' : `The roles of ${opened.name} are saved.` })
      onClose()
    } catch (error) {
      try {
        catchStale(error)
      } catch {
        setRefusal(placeFieldErrors(form, error))
      }
    }
  })

  return (
    <Dialog title={isOneself ? 'Your roles' : `Roles of ${opened.name}`} onClose={onClose} dirty={isDirty}>
      <form noValidate onSubmit={save} className="flex flex-col gap-4">
        <StaleNotice
          opened={opened}
          newer={newer}
          fields={staleFields}
          busy={change.isPending}
          onTakeTheirs={() => {
            if (newer) form.reset({ roles: newer.roles })
            takeTheirs()
          }}
        />
        <FormError error={refusal} />
        <Controller
          control={form.control}
          name="roles"
          render={({ field }) => (
            <RolePicker chosen={field.value} onChange={field.onChange} error={errors.roles?.message} />
          )}
        />
        <p className="text-small text-ink-2">
          The change holds from {isOneself ? 'your' : 'their'} next click on.
        </p>
        <Button type="submit" look="main" className="self-start" busy={change.isPending} disabled={!isDirty}>
          Save
        </Button>
      </form>
    </Dialog>
  )
}
