import { memo } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { catalogue, metricKeys, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { MethodLink } from '../../components/method-link.tsx'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatUncertainty } from '../../lib/format-figure.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import { FigureText } from '../results/figure-text.tsx'
import { figureWords } from '../results/metric-words.ts'
import { Was } from './was.tsx'
import './sides-sheet.css'

type Sides = NonNullable<Analysis['sides']>

const percent = { unit: '%', factor: 1, decimals: 1 }

interface Props {
  sides: Sides
  checks: Analysis['checks']
  /** While events are being moved: the saved figures. */
  saved?: Sides | null | undefined
}

/** The figures of each foot, their difference, and which is larger. */
export const SidesSheet = memo(function SidesSheet({ sides, checks, saved }: Props) {
  const taken = new Set(checks.filter(({ verdict }) => verdict === 'fail').flatMap(({ affects }) => affects))
  const isTaken = (key: MetricKey) => taken.has('sides') || taken.has(catalogue[key].group)
  const keys = metricKeys.filter((key) => sides.left[key] && sides.right[key])
  return (
    <Sheet title="Left and right" titleAside="difference: right less left, of their mean" flush>
      <ScrollRegion label="Figures of the left and the right foot">
        <table className="data-table sides-table">
          <caption className="sr-only">Figures of the left and the right foot</caption>
          <thead>
            <tr>
              <th scope="col">Figure</th>
              <th scope="col" className="figure">
                <span className="border-b-2 border-left text-(--color-left)">Left</span>
              </th>
              <th scope="col" className="figure">
                <span className="border-b-2 border-dashed border-right text-(--color-right)">Right</span>
              </th>
              <th scope="col" className="figure">
                Difference
              </th>
              <th scope="col">Larger</th>
            </tr>
          </thead>
          <tbody>
            {keys.map((key) => (
              <SideRow key={key} metricKey={key} sides={sides} saved={saved} struck={isTaken(key)} />
            ))}
          </tbody>
        </table>
      </ScrollRegion>
      <div className="px-3 py-2">
        <CautionLine />
      </div>
    </Sheet>
  )
})

interface RowProps extends Pick<Props, 'sides' | 'saved'> {
  metricKey: MetricKey
  struck: boolean
}

function SideRow({ metricKey, sides, saved, struck }: RowProps) {
  const asymmetry = sides.asymmetry[metricKey]
  const { name } = catalogue[metricKey]
  return (
    <tr className={struck ? 'text-ink-2 line-through' : undefined}>
      <th scope="row">
        <MethodLink noteKey={metricKey}>{name}</MethodLink>{' '}
        {struck && <span className="sr-only">(withheld by a failed check)</span>}
      </th>
      <td className="figure">
        <FigureText metricKey={metricKey} figure={sides.left[metricKey]!} unit />
        {saved && <WasFoot metricKey={metricKey} saved={saved.left} now={sides.left} />}
      </td>
      <td className="figure">
        <FigureText metricKey={metricKey} figure={sides.right[metricKey]!} unit />
        {saved && <WasFoot metricKey={metricKey} saved={saved.right} now={sides.right} />}
      </td>
      <td className="figure">
        {asymmetry && (
          <>
            {formatSigned(asymmetry.value, percent.decimals)}{' '}
            <span className="text-small text-ink-2">{formatUncertainty(asymmetry.U, percent)} %</span>
          </>
        )}
      </td>
      <td>{asymmetry && largerWords(asymmetry)}</td>
    </tr>
  )
}

interface WasFootProps {
  metricKey: MetricKey
  saved: Sides['left']
  now: Sides['left']
}

function WasFoot({ metricKey, saved, now }: WasFootProps) {
  const words = (foot: Sides['left']) => (foot[metricKey] ? figureWords(metricKey, foot[metricKey]) : null)
  return <Was saved={words(saved)} now={words(now)} />
}

/** The larger side, or that the plate cannot tell. */
function largerWords({ larger, zeroWithin }: Sides['asymmetry'][string]): string {
  return zeroWithin ? 'cannot be told from none' : larger
}
