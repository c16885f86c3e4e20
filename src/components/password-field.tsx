import { useState, type ComponentProps } from 'react'
import { Button } from './button.tsx'
import { Field } from './field.tsx'

interface PasswordFieldProps extends ComponentProps<'input'> {
  label: string
  hint?: string
  error?: string | undefined
  autoComplete: 'current-password' | 'new-password'
}

/** A password that its owner may look at while typing. */
export function PasswordField({ label, hint, error, className, ...input }: PasswordFieldProps) {
  const [shown, setShown] = useState(false)
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => (
        <div className="flex gap-2">
          <input {...input} {...control} type={shown ? 'text' : 'password'} className="control" />
          <Button
            aria-label={`${shown ? 'Hide' : 'Show'} ${label.toLowerCase()}`}
            onClick={() => setShown(!shown)}
          >
            {shown ? 'Hide' : 'Show'}
          </Button>
        </div>
      )}
    </Field>
  )
}
