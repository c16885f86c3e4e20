/**
 * Smallest worthwhile change 0.2·√(SD² − TE²), in the unit of the standard deviation `betweenSd` between subjects, which
 * holds the typical error of their measurement as well: it is taken off (Hopkins 2000, Sports Med 30:1–15; 0.2 is Cohen's
 * small effect, common practice). null where nothing is left between subjects once it is, and where either is no number.
 */
export function smallestWorthwhileChange(betweenSd: number, typicalError = 0, share = 0.2): number | null {
  const variance = (betweenSd - typicalError) * (betweenSd + typicalError)
  if (!(variance > 0 && variance < Infinity && typicalError >= 0)) return null
  return share * Math.sqrt(variance)
}
