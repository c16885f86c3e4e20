import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { ClubSettings, LandingPeakLimit } from '../../../shared/contracts/clubs.ts'
import { Protocol, protocolNames } from '../../../shared/contracts/tests.ts'
import { useChangeClubSettings } from '../../api/clubs/change-club-settings.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { CautionLine } from '../../components/caution-line.tsx'
import { TextField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { StaleNotice } from '../../components/stale-notice.tsx'
import { parseDecimal } from '../../lib/parse-decimal.ts'
import { placeFieldErrors } from '../../lib/server-field-errors.ts'
import { useFormError } from '../../lib/use-form-error.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { settingsStaleFields } from './settings-stale-fields.ts'
import { useUnsaved } from './unsaved.tsx'

const FormSchema = z.strictObject({ landingPeakLimits: z.record(Protocol, LandingPeakLimit.nullable()) })
type FormValues = z.infer<typeof FormSchema>

/** The club's own limits, one a protocol; an empty field is no limit. */
export function SettingsForm({ settings }: { settings: ClubSettings }) {
  const change = useChangeClubSettings()
  const announce = useAnnounce()
  const [refusal, setRefusal] = useFormError()
  const { opened, newer, version, catchStale, takeTheirs, startFrom } = useStaleRow(settings, ClubSettings)
  const form = useForm<FormValues>({
    resolver: zodResolver(FormSchema),
    defaultValues: valuesOf(opened),
  })
  const { errors, isDirty } = form.formState
  useUnsaved(isDirty && !change.isPending)

  const save = form.handleSubmit(async (values) => {
    setRefusal(null)
    try {
      const saved = await change.mutateAsync({ body: { landingPeakLimits: limitsOf(values), version } })
      startFrom(saved)
      form.reset(valuesOf(saved))
      announce({ text: 'The limits are saved. The Landing watch lists by them from now on.' })
    } catch (error) {
      try {
        catchStale(error)
      } catch {
        setRefusal(placeFieldErrors(form, error))
      }
    }
  })

  return (
    <Sheet title="Landing limits" className="max-w-2xl">
      <form noValidate onSubmit={save} className="flex flex-col gap-4">
        <p className="max-w-prose">
          A landing whose peak force is above the limit is listed for the physio. No validated injury limit
          exists, so none is set until your club sets its own.
        </p>
        <StaleNotice
          opened={opened}
          newer={newer}
          fields={settingsStaleFields}
          busy={change.isPending}
          onTakeTheirs={() => {
            if (newer) form.reset(valuesOf(newer))
            takeTheirs()
          }}
        />
        <FormError error={refusal} />
        {Protocol.options.map((protocol) => (
          <TextField
            key={protocol}
            label={`${protocolNames[protocol]}: peak landing force, body weights`}
            hint="Leave it empty for no limit."
            inputMode="decimal"
            autoComplete="off"
            className="max-w-80"
            error={errors.landingPeakLimits?.[protocol]?.message}
            {...form.register(`landingPeakLimits.${protocol}`, { setValueAs: parseDecimal })}
          />
        ))}
        <CautionLine />
        <Button type="submit" look="main" className="self-start" busy={change.isPending} disabled={!isDirty}>
          Save the limits
        </Button>
      </form>
    </Sheet>
  )
}

/** In the form an absent limit is an empty field. */
function valuesOf({ landingPeakLimits }: ClubSettings): FormValues {
  const limits = Protocol.options.map((protocol) => [protocol, landingPeakLimits[protocol] ?? null])
  return { landingPeakLimits: Object.fromEntries(limits) as FormValues['landingPeakLimits'] }
}

function limitsOf({ landingPeakLimits }: FormValues): ClubSettings['landingPeakLimits'] {
  return Object.fromEntries(Object.entries(landingPeakLimits).filter(([, limit]) => limit !== null))
}
