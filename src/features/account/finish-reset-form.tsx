import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { finishReset } from '../../../shared/contracts/account.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { useFinishReset } from '../../api/account/finish-reset.ts'
import { Button } from '../../components/button.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { PasswordField } from '../../components/password-field.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

interface FinishResetFormProps {
  token: string
  email: string
  onDone: () => void
}

export function FinishResetForm({ token, email, onDone }: FinishResetFormProps) {
  const form = useForm({ resolver: zodResolver(finishReset.body), defaultValues: { password: '' } })
  const finish = useFinishReset()
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (body) => {
    setRefusal(null)
    try {
      await finish.mutateAsync({ params: { token }, body })
      onDone()
    } catch (error) {
      setRefusal(placeFieldErrors(form, error))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <FormError error={refusal} />
      <TextField label="E-mail address" value={email} readOnly autoComplete="username" />
      <PasswordField
        label="New password"
        hint={`At least ${limits.passwordMin} characters; several words do well.`}
        autoComplete="new-password"
        error={form.formState.errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" look="main" busy={finish.isPending}>
        Set the password
      </Button>
    </form>
  )
}
