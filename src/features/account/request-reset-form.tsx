import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { requestReset } from '../../../shared/contracts/account.ts'
import { useRequestReset } from '../../api/account/request-reset.ts'
import { Button } from '../../components/button.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

export function RequestResetForm({ onSent }: { onSent: (email: string) => void }) {
  const form = useForm({ resolver: zodResolver(requestReset.body), defaultValues: { email: '' } })
  const request = useRequestReset()
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (body) => {
    setRefusal(null)
    try {
      await request.mutateAsync({ body })
      onSent(body.email)
    } catch (error) {
      setRefusal(placeFieldErrors(form, error))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <FormError error={refusal} />
      <TextField
        label="E-mail address"
        hint="The one you sign in with."
        type="email"
        autoComplete="username"
        error={form.formState.errors.email?.message}
        {...form.register('email')}
      />
      <Button type="submit" look="main" busy={request.isPending}>
        Send me a link
      </Button>
    </form>
  )
}
