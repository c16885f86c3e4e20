import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

const { display } = catalogue.landingPeakForcePerBodyWeight

/** The landing in plain words. */
export function OwnLanding({ newest }: { newest: ResultPoint }) {
  const peak = newest.means.landingPeakForcePerBodyWeight
  if (!peak) return null
  const sure = formatUncertainty(peak.U, display)?.replace('±\u00a0', '')
  return (
    <Sheet title="How you landed">
      <p className="pb-2">
        {formatValue(peak.value, display)} times your body weight at the hardest moment
        {peak.trials > 1 && `, on average over ${peak.trials} landings`}
        {sure !== undefined && `, give or take ${sure}`}.
      </p>
      <p className="pb-1 text-small text-ink-2">
        If something hurts, tell your coach or physio, whatever a number says.
      </p>
      <CautionLine />
    </Sheet>
  )
}
