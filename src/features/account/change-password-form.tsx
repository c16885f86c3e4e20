import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { ChangePasswordForm as ChangePasswordSchema } from '../../../shared/contracts/account.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { useChangePassword } from '../../api/account/change-password.ts'
import { isApiError } from '../../api/api-error.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { FormError } from '../../components/form-error.tsx'
import { PasswordField } from '../../components/password-field.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

export function ChangePasswordForm({ email }: { email: string }) {
  const form = useForm({
    resolver: zodResolver(ChangePasswordSchema),
    defaultValues: { current: '', next: '' },
  })
  const { errors } = form.formState
  const change = useChangePassword()
  const announce = useAnnounce()
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (body) => {
    setRefusal(null)
    try {
      await change.mutateAsync({ body })
      form.reset()
      announce({ text: 'Your password is changed.' })
    } catch (error) {
      if (isApiError(error, 'wrong-credentials')) {
        form.setError('current', { message: 'This is not your present password' }, { shouldFocus: true })
      } else setRefusal(placeFieldErrors(form, error))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <FormError error={refusal} />
      <ErrorSummary errors={errors} labels={{ current: 'Present password', next: 'New password' }} />
      <input type="hidden" value={email} autoComplete="username" readOnly />
      <PasswordField
        label="Present password"
        autoComplete="current-password"
        error={errors.current?.message}
        {...form.register('current')}
      />
      <PasswordField
        label="New password"
        hint={`At least ${limits.passwordMin} characters; several words do well.`}
        autoComplete="new-password"
        error={errors.next?.message}
        {...form.register('next')}
      />
      <Button type="submit" look="main" className="self-start" busy={change.isPending}>
        Change the password
      </Button>
    </form>
  )
}
