import { useForm } from 'react-hook-form'
import { changePlateCalibration, PlateCalibration } from '../../../shared/contracts/measuring.ts'
import { zodResolver } from '@hookform/resolvers/zod'
import { useRoles } from '../../api/account/get-me.ts'
import { useChangePlateCalibration } from '../../api/clubs/change-plate-calibration.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { StaleNotice } from '../../components/stale-notice.tsx'
import { formatNumber } from '../../lib/format-figure.ts'
import { mayCall } from '../../lib/may-call.ts'
import { parseDecimal } from '../../lib/parse-decimal.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { StaleLine } from '../recomputes/stale-line.tsx'
import { EditionLine } from './edition-line.tsx'
import { bodyOf, channels, channelWords, PlatesValues, platesStaleFields, valuesOf } from './plates-values.ts'
import { useUnsaved } from './unsaved.tsx'

/** How far the club's plates are to be trusted, and where they stand. */
export function PlatesForm({ calibration }: { calibration: PlateCalibration }) {
  const change = useChangePlateCalibration()
  const mayChange = mayCall(changePlateCalibration, useRoles())
  const announce = useAnnounce()
  const [refusal, setRefusal] = useFormError()
  const stale = useStaleRow(calibration, PlateCalibration)
  const form = useForm<PlatesValues>({
    resolver: zodResolver(PlatesValues),
    defaultValues: valuesOf(stale.opened),
  })
  const { errors, isDirty } = form.formState
  useUnsaved(isDirty && !change.isPending)

  const save = form.handleSubmit(async (values) => {
    setRefusal(null)
    try {
      const saved = await change.mutateAsync({ body: { ...bodyOf(values), version: stale.version } })
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
    <Sheet title="Plates and place" titleAside={<EditionLine edition={stale.opened} />} className="max-w-2xl">
      <form noValidate onSubmit={save} className="flex flex-col gap-4">
        <p className="max-w-prose">
          The calibration’s expanded relative uncertainty (k = 2), from the certificate of the plate. 0.5 % is
          taken where nothing is known, as makers commonly state (common practice). It widens ± and moves no
          figure.
        </p>
        <StaleNotice
          opened={stale.opened}
          newer={stale.newer}
          fields={platesStaleFields}
          busy={change.isPending}
          onTakeTheirs={() => {
            if (stale.newer) form.reset(valuesOf(stale.newer))
            stale.takeTheirs()
          }}
        />
        <FormError error={refusal} />
        <div className="grid gap-4 sm:grid-cols-2">
          {channels.map((channel) => (
            <TextField
              key={channel}
              label={`${channelWords[channel]}, %`}
              inputMode="decimal"
              readOnly={!mayChange}
              autoComplete="off"
              error={errors.percent?.[channel]?.message}
              {...form.register(`percent.${channel}`, { setValueAs: parseDecimal })}
            />
          ))}
        </div>
        <p className="max-w-prose">
          Gravity follows the place of the plates by the international gravity formula of 1980 with the
          free-air correction; standard gravity, 9.80665 m/s², where it is unknown. It is{' '}
          {formatNumber(stale.opened.gravity, 5)} m/s² now. Body mass, drop and jump height rest on it.
        </p>
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField
            label="Latitude, degrees"
            hint="South is negative. Leave both empty where it is unknown."
            inputMode="decimal"
            readOnly={!mayChange}
            autoComplete="off"
            error={errors.latitudeDeg?.message}
            {...form.register('latitudeDeg', { setValueAs: parseDecimal })}
          />
          <TextField
            label="Altitude, m"
            hint="Above the sea."
            inputMode="decimal"
            readOnly={!mayChange}
            autoComplete="off"
            error={errors.altitudeM?.message}
            {...form.register('altitudeM', { setValueAs: parseDecimal })}
          />
        </div>
        {mayChange && (
          <Button
            type="submit"
            look="main"
            className="self-start"
            busy={change.isPending}
            disabled={!isDirty}
          >
            Save plates and place
          </Button>
        )}
        <StaleLine />
      </form>
    </Sheet>
  )
}
