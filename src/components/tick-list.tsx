import { FieldGroup, Tick } from './field.tsx'

interface TickListProps {
  label: string
  hint?: string
  items: { id: string; words: string; hint?: string }[]
  /** Said where there is nothing to choose from. */
  none: string
  chosen: string[]
  onChange: (chosen: string[]) => void
  error?: string | undefined
}

/** Any number out of a list. A long one scrolls within itself. */
export function TickList({ label, hint, items, none, chosen, onChange, error }: TickListProps) {
  const toggle = (id: string, on: boolean) =>
    onChange(on ? [...chosen, id] : chosen.filter((other) => other !== id))
  return (
    <FieldGroup label={label} hint={hint} error={error}>
      {items.length === 0 && <p className="text-ink-2">{none}</p>}
      <div className="grid max-h-72 gap-x-6 gap-y-2 overflow-y-auto p-1 sm:grid-cols-2">
        {items.map((item) => (
          <Tick
            key={item.id}
            label={item.words}
            hint={item.hint}
            checked={chosen.includes(item.id)}
            onChange={(event) => toggle(item.id, event.target.checked)}
          />
        ))}
      </div>
    </FieldGroup>
  )
}
