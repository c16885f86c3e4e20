import { useEffect, useRef } from 'react'
import { Field } from './field.tsx'

interface SearchFieldProps {
  label: string
  value: string
  onChange: (value: string) => void
}

/**
 * Search in a list. The input keeps its own text: the address follows a moment later, and a controlled input would
 * lose the cursor's place on the way.
 */
export function SearchField({ label, value, onChange }: SearchFieldProps) {
  const input = useRef<HTMLInputElement>(null)
  useEffect(() => {
    const element = input.current
    if (element && element !== document.activeElement) element.value = value
  }, [value])
  return (
    <Field label={label} className="sm:w-64">
      {(control) => (
        <input
          {...control}
          ref={input}
          type="search"
          defaultValue={value}
          onChange={(event) => onChange(event.target.value)}
          // Inside a form, Enter here must not send the form.
          onKeyDown={(event) => event.key === 'Enter' && event.preventDefault()}
          className="control"
        />
      )}
    </Field>
  )
}
