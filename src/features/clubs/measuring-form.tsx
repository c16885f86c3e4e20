import { useForm } from 'react-hook-form'
import { changeMeasuringSettings, MeasuringSettings } from '../../../shared/contracts/measuring.ts'
import {
  methodChoiceKeys,
  methodChoices,
  type NumberChoice,
} from '../../../shared/mechanics/settings/choices.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import { useRoles } from '../../api/account/get-me.ts'
import { useChangeMeasuringSettings } from '../../api/clubs/change-measuring-settings.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { SelectField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { StaleNotice } from '../../components/stale-notice.tsx'
import { Table } from '../../components/table.tsx'
import { mayCall } from '../../lib/may-call.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { StaleLine } from '../recomputes/stale-line.tsx'
import { choiceColumns } from './choice-columns.tsx'
import { EditionLine } from './edition-line.tsx'
import { FixedSettings } from './fixed-settings.tsx'
import {
  changedOf,
  faultsOf,
  groups,
  measuringStaleFields,
  methodNames,
  type MeasuringValues,
  valuesOf,
} from './measuring-values.ts'
import { useUnsaved } from './unsaved.tsx'

/** The engine's settings: those that are the club's choice, each with its bounds, and those that the method fixes. */
export function MeasuringForm({ settings }: { settings: MeasuringSettings }) {
  const change = useChangeMeasuringSettings()
  const mayChange = mayCall(changeMeasuringSettings, useRoles())
  const announce = useAnnounce()
  const [refusal, setRefusal] = useFormError()
  const stale = useStaleRow(settings, MeasuringSettings)
  const form = useForm<MeasuringValues>({ defaultValues: valuesOf(stale.opened) })
  const { isDirty } = form.formState
  useUnsaved(isDirty && !change.isPending)

  const save = form.handleSubmit(async (values) => {
    setRefusal(null)
    const faults = Object.entries(faultsOf(values)) as [NumberChoice, string][]
    for (const [key, message] of faults) form.setError(`numbers.${key}`, { message })
    const [first] = faults
    if (first) return form.setFocus(`numbers.${first[0]}`)
    try {
      const saved = await change.mutateAsync({ body: { changed: changedOf(values), version: stale.version } })
      stale.startFrom(saved)
      form.reset(valuesOf(saved))
      announce({ text: 'Saved. New recordings are analysed with it; earlier figures stay as they are.' })
    } catch (error) {
      try {
        stale.catchStale(error)
      } catch {
        setRefusal(error)
      }
    }
  })

  return (
    <Sheet title="Measuring settings" titleAside={<EditionLine edition={stale.opened} />}>
      <form noValidate onSubmit={save} className="flex flex-col gap-4">
        <p className="max-w-prose">
          What the engine goes by. A changed setting makes figures of this club differ from those of clubs
          that keep the default, and from its own before: recompute, so that a trend holds figures of one
          kind.
        </p>
        <StaleNotice
          opened={stale.opened}
          newer={stale.newer}
          fields={measuringStaleFields}
          busy={change.isPending}
          onTakeTheirs={() => {
            if (stale.newer) form.reset(valuesOf(stale.newer))
            stale.takeTheirs()
          }}
        />
        <FormError error={refusal} />
        {methodChoiceKeys.map((key) => {
          const { effect, source, options } = methodChoices[key]
          if (!mayChange)
            return (
              <p key={key}>
                {methodNames[key]}: {options[form.getValues(`methods.${key}`)]}.
              </p>
            )
          return (
            <SelectField
              key={key}
              label={methodNames[key]}
              hint={`${effect}. Source: ${source}.`}
              className="max-w-prose"
              {...form.register(`methods.${key}`)}
            >
              {Object.entries(options).map(([value, words]) => (
                <option key={value} value={value}>
                  {words}
                  {value === defaultSettings[key] ? ' (default)' : ''}
                </option>
              ))}
            </SelectField>
          )
        })}
        {groups.map(({ title, keys }) => (
          <div key={title}>
            <h3 className="pb-1 font-semibold">{title}</h3>
            <ScrollRegion label={title}>
              <Table
                caption={title}
                columns={choiceColumns(form, mayChange)}
                rows={keys}
                rowKey={(key) => key}
              />
            </ScrollRegion>
          </div>
        ))}
        {mayChange && (
          <Button
            type="submit"
            look="main"
            className="self-start"
            busy={change.isPending}
            disabled={!isDirty}
          >
            Save the measuring settings
          </Button>
        )}
        <StaleLine />
      </form>
      <FixedSettings />
    </Sheet>
  )
}
