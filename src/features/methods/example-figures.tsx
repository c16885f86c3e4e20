import { Link } from 'react-router-dom'
import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { Facts } from '../../components/facts.tsx'
import { formatNumber, formatUncertainty } from '../../lib/format-figure.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import { pathOf } from '../../lib/paths.ts'
import { FigureText } from '../results/figure-text.tsx'
import type { WorkedExample } from './worked-example.ts'

interface Props {
  example: WorkedExample
  metricKey: MetricKey
  from: readonly MetricKey[]
}

/** The figure of the sample with its uncertainty, that of each foot, and the figures that went into it. */
export function ExampleFigures({ example: { analysis }, metricKey, from }: Props) {
  const figure = analysis.metrics[metricKey]
  const missing = analysis.missing.find(({ key }) => key === metricKey)
  return (
    <>
      {figure && (
        <p className="text-page" data-testid="worked-figure">
          <FigureText metricKey={metricKey} figure={figure} unit strong />
        </p>
      )}
      {figure && (
        <p className="pb-2 text-small text-ink-2">
          {figure.U === null
            ? 'Given without uncertainty, for the reason under limits.'
            : `± is the expanded uncertainty for about 95 %, coverage factor k = ${formatNumber(figure.k, 2)}.`}
        </p>
      )}
      {missing && <p>The sample gives none: {missing.reason}</p>}
      <Feet analysis={analysis} metricKey={metricKey} />
      {from.length > 0 && (
        <>
          <h3 className="pt-2 text-small text-ink-2">What goes in</h3>
          <Facts
            facts={from.map((key) => [
              catalogue[key].name,
              <Link key={key} to={pathOf.method(key)}>
                {analysis.metrics[key] ? (
                  <FigureText metricKey={key} figure={analysis.metrics[key]} unit />
                ) : (
                  'Method note'
                )}
              </Link>,
            ])}
          />
        </>
      )}
    </>
  )
}

const percent = { unit: '%', factor: 1, decimals: 1 }

function Feet({ analysis, metricKey }: { analysis: WorkedExample['analysis']; metricKey: MetricKey }) {
  const left = analysis.sides?.left[metricKey]
  const right = analysis.sides?.right[metricKey]
  const asymmetry = analysis.sides?.asymmetry[metricKey]
  if (!left || !right) return null
  return (
    <Facts
      facts={[
        ['Left foot', <FigureText key="left" metricKey={metricKey} figure={left} unit />],
        ['Right foot', <FigureText key="right" metricKey={metricKey} figure={right} unit />],
        ...(asymmetry
          ? ([
              [
                'Right less left, of their mean',
                `${formatSigned(asymmetry.value, 1)} ${formatUncertainty(asymmetry.U, percent) ?? ''} %`,
              ],
            ] as [string, string][])
          : []),
      ]}
    />
  )
}
