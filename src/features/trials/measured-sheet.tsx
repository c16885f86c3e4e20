import { memo, useState } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { catalogue, isMetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { MetricGroup } from '../../../shared/mechanics/types.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { MethodLink } from '../../components/method-link.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { FigureText } from '../results/figure-text.tsx'
import { figureWords } from '../results/metric-words.ts'
import { measuredGroups, type MeasuredFigure } from './measured-groups.ts'
import { Was } from './was.tsx'

/** A phone begins with these; the other groups are a tap away. At the desk all stand open. */
const openOnPhone = new Set<MetricGroup>(['jump', 'landing'])

/** Every figure of the trial, by group; what a failed check takes away is struck, what is missing says why. */
export const MeasuredSheet = memo(function MeasuredSheet({
  analysis,
  saved,
}: {
  analysis: Analysis
  saved?: Analysis | undefined
}) {
  const [atDesk] = useState(
    () => typeof matchMedia === 'undefined' || matchMedia('(min-width: 40rem)').matches,
  )
  return (
    <Sheet title="Measured" titleAside="± is how sure the plate is of this one trial, for about 95 %">
      <div className="gap-x-8 sm:columns-2 xl:columns-3">
        {measuredGroups(analysis).map(({ group, words, figures }) => (
          <details key={group} className="pb-4" open={atDesk || openOnPhone.has(group)}>
            <summary className="cursor-pointer break-after-avoid border-b border-ink text-small text-ink-2">
              <h3 className="inline">{words}</h3>
            </summary>
            <dl>
              {figures.map((measured) => (
                <MeasuredRow key={measured.metric.key} {...measured} saved={saved?.metrics} />
              ))}
            </dl>
          </details>
        ))}
      </div>
      <Missing missing={analysis.missing} />
      <CautionLine />
    </Sheet>
  )
})

interface RowProps extends MeasuredFigure {
  saved: Analysis['metrics'] | undefined
}

function MeasuredRow({ metric, figure, withheldBecause, saved }: RowProps) {
  const before = saved?.[metric.key]
  return (
    <div className="grid break-inside-avoid grid-cols-[1fr_auto] items-baseline gap-x-4 border-b border-rule-2 py-1">
      <dt className={withheldBecause ? 'text-ink-2' : undefined}>
        <MethodLink noteKey={metric.key}>{metric.name}</MethodLink>
      </dt>
      <dd className="text-end">
        {withheldBecause ? (
          <s className="text-ink-2">
            <span className="sr-only">withheld: </span>
            <FigureText metricKey={metric.key} figure={figure} unit />
          </s>
        ) : (
          <FigureText metricKey={metric.key} figure={figure} unit />
        )}
        {saved && (
          <Was
            saved={before ? figureWords(metric.key, before) : null}
            now={figureWords(metric.key, figure)}
          />
        )}
      </dd>
      {withheldBecause && <dd className="col-span-full text-small text-ink-2">{withheldBecause}</dd>}
    </div>
  )
}

function Missing({ missing }: Pick<Analysis, 'missing'>) {
  if (missing.length === 0) return null
  return (
    <details className="pb-3">
      <summary className="cursor-pointer">
        {missing.length} {missing.length === 1 ? 'figure' : 'figures'} could not be computed
      </summary>
      <ul className="text-small">
        {missing.map(({ key, reason }) => (
          <li key={key} className="py-0.5">
            {isMetricKey(key) ? catalogue[key].name : key}: <span className="text-ink-2">{reason}</span>
          </li>
        ))}
      </ul>
    </details>
  )
}
