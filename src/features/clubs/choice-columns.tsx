import { useWatch, type UseFormReturn } from 'react-hook-form'
import { defaultSettings, settingDefinitions } from '../../../shared/mechanics/settings.ts'
import { type NumberChoice, numberChoices } from '../../../shared/mechanics/settings/choices.ts'
import { Button } from '../../components/button.tsx'
import { FieldError } from '../../components/field.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { parseDecimal } from '../../lib/parse-decimal.ts'
import { settingWords } from '../methods/setting-words.ts'
import { isChanged, type MeasuringValues } from './measuring-values.ts'

/** A setting in each row: its value to change, and what it is to be judged by. */
export function choiceColumns(
  form: UseFormReturn<MeasuringValues>,
  mayChange: boolean,
): Column<NumberChoice>[] {
  const columns: Column<NumberChoice>[] = [
    {
      key: 'setting',
      head: 'Setting',
      cell: (key) => (
        <>
          {settingWords(key)} <code className="text-small font-normal text-ink-2">{key}</code>{' '}
          <ChangedTag form={form} choice={key} />
        </>
      ),
    },
    {
      key: 'value',
      head: 'Value',
      cell: (key) => <ValueField form={form} choice={key} readOnly={!mayChange} />,
    },
    { key: 'unit', head: 'Unit', cell: (key) => settingDefinitions[key].unit },
    { key: 'default', head: 'Default', figure: true, cell: (key) => String(defaultSettings[key]) },
    {
      key: 'bounds',
      head: 'From, to',
      figure: true,
      cell: (key) => `${numberChoices[key].min}, ${numberChoices[key].max}`,
    },
    { key: 'source', head: 'Source', cell: (key) => settingDefinitions[key].source },
    { key: 'effect', head: 'What a larger value does', cell: (key) => settingDefinitions[key].effect },
  ]
  const back: Column<NumberChoice> = {
    key: 'back',
    head: '',
    label: 'Back to default',
    cell: (key) => <BackToDefault form={form} choice={key} />,
  }
  return mayChange ? [...columns, back] : columns
}

interface ChoiceProps {
  form: UseFormReturn<MeasuringValues>
  choice: NumberChoice
}

/** Whether a setting differs from the default as the form stands; its cell alone follows what is typed. */
function useIsChanged({ form, choice }: ChoiceProps): boolean {
  const value = useWatch({ control: form.control, name: `numbers.${choice}` })
  return isChanged(choice, value)
}

function ChangedTag(props: ChoiceProps) {
  return useIsChanged(props) && <Tag>changed</Tag>
}

function BackToDefault(props: ChoiceProps) {
  const { form, choice } = props
  if (!useIsChanged(props)) return null
  return (
    <Button
      look="word"
      aria-label={`${settingWords(choice)} back to default`}
      onClick={() => {
        form.setValue(`numbers.${choice}`, defaultSettings[choice], { shouldDirty: true })
        form.clearErrors(`numbers.${choice}`)
      }}
    >
      Back to default
    </Button>
  )
}

interface ValueFieldProps extends ChoiceProps {
  readOnly: boolean
}

function ValueField({ form, choice, readOnly }: ValueFieldProps) {
  const fault = form.formState.errors.numbers?.[choice]?.message
  const id = `setting-${choice}-error`
  return (
    <div className="w-32">
      <input
        type="text"
        className="control"
        aria-label={`${settingWords(choice)}, ${settingDefinitions[choice].unit}`}
        aria-invalid={fault === undefined ? undefined : true}
        aria-describedby={fault === undefined ? undefined : id}
        inputMode="decimal"
        readOnly={readOnly}
        autoComplete="off"
        {...form.register(`numbers.${choice}`, { setValueAs: parseDecimal })}
      />
      <FieldError id={id} error={fault} />
    </div>
  )
}
