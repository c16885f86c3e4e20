/** Stands wherever landing loads or asymmetry are shown. */
export function CautionLine() {
  return (
    <p className="text-small text-ink-2">
      A measurement, not a diagnosis; thresholds are the club’s; decisions belong to licensed practice and
      local rules.
    </p>
  )
}
