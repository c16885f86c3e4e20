import { useId, type ComponentProps, type ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'

interface FieldWords {
  label: string
  hint?: ReactNode
  /** What is wrong with it and what to do. */
  error?: string | undefined
}

interface ControlProps {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

interface FieldProps extends FieldWords {
  className?: string | undefined
  children: (control: ControlProps) => ReactNode
}

/** A labelled control with its hint and error tied to it. */
export function Field({ label, hint, error, className, children }: FieldProps) {
  const id = useId()
  const described = classNames(hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`)
  return (
    <div className={classNames('flex flex-col gap-1', className)}>
      <label htmlFor={id} className="font-semibold">
        {label}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-small text-ink-2">
          {hint}
        </p>
      )}
      {children({
        id,
        'aria-describedby': described || undefined,
        'aria-invalid': error === undefined ? undefined : true,
      })}
      <FieldError id={`${id}-error`} error={error} />
    </div>
  )
}

export function FieldError({ id, error }: { id: string; error: string | undefined }) {
  if (error === undefined) return null
  return (
    <p id={id} className="text-small font-semibold text-stop">
      {error}
    </p>
  )
}

type TextFieldProps = FieldWords & ComponentProps<'input'>

/** Spread react-hook-form's `register(…)` into it. */
export function TextField({ label, hint, error, className, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => <input type="text" {...input} {...control} className="control" />}
    </Field>
  )
}

export function TextAreaField({
  label,
  hint,
  error,
  className,
  ...area
}: FieldWords & ComponentProps<'textarea'>) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => <textarea rows={3} {...area} {...control} className="control" />}
    </Field>
  )
}

/** Options come as `<option>` children. */
export function SelectField({
  label,
  hint,
  error,
  className,
  ...select
}: FieldWords & ComponentProps<'select'>) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(control) => <select {...select} {...control} className="control" />}
    </Field>
  )
}

export function Tick({
  label,
  hint,
  className,
  ...input
}: Omit<FieldWords, 'error'> & ComponentProps<'input'>) {
  const id = useId()
  return (
    <div className={classNames('flex items-start gap-2', className)}>
      <input
        type="checkbox"
        {...input}
        id={id}
        aria-describedby={hint === undefined ? undefined : `${id}-hint`}
        className="tick mt-0.5"
      />
      <div>
        <label htmlFor={id}>{label}</label>
        {hint !== undefined && (
          <p id={`${id}-hint`} className="text-small text-ink-2">
            {hint}
          </p>
        )}
      </div>
    </div>
  )
}

/** Controls that answer one question together. */
export function FieldGroup({ label, hint, error, children }: FieldWords & { children: ReactNode }) {
  const id = useId()
  const described = classNames(hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`)
  return (
    <fieldset aria-describedby={described || undefined} className="flex min-w-0 flex-col gap-1">
      <legend className="mb-1 font-semibold">{label}</legend>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-small text-ink-2">
          {hint}
        </p>
      )}
      {children}
      <FieldError id={`${id}-error`} error={error} />
    </fieldset>
  )
}
