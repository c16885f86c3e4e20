import { useId, useState } from 'react'
import { FieldGroup } from '../../components/field.tsx'
import { chooseTheme, chosenTheme, type Theme } from '../../lib/theme.ts'

const words: Record<Theme, string> = { system: 'As the device is set', light: 'Light', dark: 'Dark' }

export function ThemeChoice() {
  const [theme, setTheme] = useState(chosenTheme)
  const name = useId()
  const choose = (next: Theme) => {
    chooseTheme(next)
    setTheme(next)
  }
  return (
    <FieldGroup label="Light or dark" hint="Remembered on this device.">
      <div className="flex flex-wrap gap-x-6 gap-y-2 pt-1">
        {(Object.keys(words) as Theme[]).map((option) => (
          <label key={option} className="flex items-center gap-2">
            <input
              type="radio"
              className="tick"
              name={name}
              checked={theme === option}
              onChange={() => choose(option)}
            />
            {words[option]}
          </label>
        ))}
      </div>
    </FieldGroup>
  )
}
