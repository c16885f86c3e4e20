import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { acceptInvitation, type InvitationView, type Me } from '../../../shared/contracts/account.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import type { z } from 'zod'
import { useAcceptInvitation } from '../../api/account/accept-invitation.ts'
import { Button } from '../../components/button.tsx'
import { ErrorSummary } from '../../components/error-summary.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { PasswordField } from '../../components/password-field.tsx'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'

type Invitation = z.infer<typeof InvitationView>

interface InvitationFormProps {
  token: string
  invitation: Invitation
  onAccepted: (me: Me) => void
}

/** A new person gives a name and chooses a password; a known one proves the account with the password it has. */
export function InvitationForm({ token, invitation, onAccepted }: InvitationFormProps) {
  const form = useForm({
    resolver: zodResolver(acceptInvitation.body),
    defaultValues: { name: invitation.name, password: '' },
  })
  const { errors } = form.formState
  const accept = useAcceptInvitation()
  const [refusal, setRefusal] = useFormError()

  const submit = form.handleSubmit(async (body) => {
    setRefusal(null)
    try {
      onAccepted(await accept.mutateAsync({ params: { token }, body }))
    } catch (error) {
      setRefusal(placeFieldErrors(form, error))
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <FormError error={refusal} />
      <ErrorSummary errors={errors} labels={{ name: 'Your name', password: 'Password' }} />
      <TextField label="E-mail address" value={invitation.email} readOnly autoComplete="username" />
      {!invitation.hasAccount && (
        <TextField
          label="Your name"
          hint="As your club should see it."
          autoComplete="name"
          error={errors.name?.message}
          {...form.register('name')}
        />
      )}
      <PasswordField
        label="Password"
        hint={
          invitation.hasAccount
            ? 'The one you sign in with already.'
            : `At least ${limits.passwordMin} characters; several words do well.`
        }
        autoComplete={invitation.hasAccount ? 'current-password' : 'new-password'}
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" look="main" busy={accept.isPending}>
        Join {invitation.clubName}
      </Button>
    </form>
  )
}
