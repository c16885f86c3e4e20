import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { SignInForm as SignInSchema, type Me } from '../../../shared/contracts/account.ts'
import { useSignIn } from '../../api/account/sign-in.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { PasswordField } from '../../components/password-field.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

interface SignInFormProps {
  /** Filled in where it is known already. */
  email?: string
  onSignedIn: (me: Me) => void
}

export function SignInForm({ email = '', onSignedIn }: SignInFormProps) {
  const form = useForm({ resolver: zodResolver(SignInSchema), defaultValues: { email, password: '' } })
  const { errors } = form.formState
  const signIn = useSignIn()
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (body) => {
    setRefusal(null)
    try {
      onSignedIn(await signIn.mutateAsync({ body }))
    } catch (error) {
      form.resetField('password')
      setRefusal(placeFieldErrors(form, error))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <FormError error={refusal} />
      <ErrorSummary errors={errors} labels={{ email: 'E-mail address', password: 'Password' }} />
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" look="main" busy={signIn.isPending}>
        {signIn.isPending ? 'Signing in…' : 'Sign in'}
      </Button>
    </form>
  )
}
