import type { FigureOf } from '../../../shared/contracts/recomputes.ts'
import { catalogue, isMetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { FigureDisplay } from '../../lib/format-figure.ts'
import { formatNumber } from '../../lib/format-figure.ts'

const percent: FigureDisplay = { unit: '%', factor: 1, decimals: 1 }
const plain: FigureDisplay = { unit: '', factor: 1, decimals: 3 }

/** How a moved figure is shown: an asymmetry in percent, a metric as its catalogue says. */
export function displayOf(metric: string, of: FigureOf): FigureDisplay {
  if (of === 'asymmetry') return percent
  return isMetricKey(metric) ? catalogue[metric].display : plain
}

const ofWords: Record<FigureOf, string> = {
  both: '',
  left: ', left',
  right: ', right',
  asymmetry: ', asymmetry',
}

/** "Landing peak, left" */
export function figureName(metric: string, of: FigureOf): string {
  return (isMetricKey(metric) ? catalogue[metric].name : metric) + ofWords[of]
}

/** Two significant digits: a change is often smaller than the last digit that is shown of the figure. */
export function formatSmall(value: number): string {
  const size = Math.abs(value)
  if (size === 0) return '0'
  const decimals = Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(size))))
  return formatNumber(value, decimals)
}

/** A change in the unit in which the figure is shown, with it. */
export function formatChange(change: number | null, display: FigureDisplay): string {
  if (change === null) return '–'
  return `${formatSmall(change * display.factor)}\u00a0${display.unit}`.trimEnd()
}

/** "0.12 ×"; below a hundredth it is nothing that anybody could notice. */
export function formatMultiple(multiple: number | null): string {
  if (multiple === null) return '–'
  return multiple < 0.01 ? '< 0.01' : formatSmall(multiple)
}
