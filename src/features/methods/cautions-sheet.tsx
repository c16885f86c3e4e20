import { Sheet } from '../../components/sheet.tsx'

/** What the figures are not, for everybody who reads them. */
export function CautionsSheet() {
  return (
    <Sheet title="Cautions">
      <ul className="flex max-w-prose list-disc flex-col gap-1 ps-5">
        <li>
          Landing loads and asymmetry are a measurement, not a diagnosis; thresholds are the club’s; decisions
          belong to licensed practice and local rules.
        </li>
        <li>
          No validated injury limit exists for landing force or loading rate, and Underfoot claims none.
        </li>
        <li>
          Landing load rises with jump height: judge it against the athlete’s own landings at the same speed.
        </li>
        <li>Jump testing of injured or under-age athletes needs supervision.</li>
        <li>
          A figure that a failed check takes away stays out of means and trends and raises no flag. It is
          shown struck, with the reason.
        </li>
      </ul>
    </Sheet>
  )
}
