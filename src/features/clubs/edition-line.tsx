import type { MeasuringSettings } from '../../../shared/contracts/measuring.ts'
import { useMe } from '../../api/account/get-me.ts'
import { formatMoment } from '../../lib/format-date.ts'

/** "edition 3, by Wanda Crest on 12 Nov 2026, 14:05" */
export function EditionLine({ edition }: { edition: Pick<MeasuringSettings, 'version' | 'change'> }) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const { version, change } = edition
  if (change === null) return <>as every club begins</>
  return (
    <>
      edition {version}, by {change.byName}, {formatMoment(change.at, timeZone)}
    </>
  )
}
