import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { protocolNames } from '../../../shared/contracts/tests.ts'
import { catalogue, isMetricKey, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { checkDefinitions } from '../../../shared/mechanics/checks/check-definitions.ts'
import type { MetricDefinition } from '../../../shared/mechanics/types.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { Facts } from '../../components/facts.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { pathOf, paths } from '../../lib/paths.ts'
import { groupWords, phaseWords } from '../trials/event-words.ts'
import { evidenceWords } from './evidence-words.ts'
import { ExampleFigures } from './example-figures.tsx'
import { ExampleSource } from './example-source.tsx'
import { ExampleTrace } from './example-trace.tsx'
import { Formula } from './formula.tsx'
import { checksOf } from './note-checks.ts'
import { metricNotes } from './notes/metric-notes.ts'
import { sampleOfMetric } from './sample-of.ts'
import { SettingsTable } from './settings-table.tsx'
import { Symbols } from './symbols.tsx'
import { useWorkedExample } from './use-worked-example.ts'

/** The Method note of a metric: what it is, how it is computed, what it rests on, and an example computed here. */
export function MetricNoteView({ metricKey }: { metricKey: MetricKey }) {
  const metric = catalogue[metricKey]
  const note = metricNotes[metricKey]
  const sample = sampleOfMetric(metricKey)
  const example = useWorkedExample(sample)
  const touchesHealth = metric.group === 'landing' || metric.group === 'sides' || metric.feet !== undefined
  return (
    <>
      <PageHead
        title={metric.name}
        context={
          <>
            <Link to={paths.methods}>Methods</Link> · {groupWords[metric.group]}
          </>
        }
      />
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="flex min-w-0 flex-col gap-5">
          <Sheet title="Definition">
            <p className="max-w-prose">{note.definition}</p>
            <Formula tex={note.formula} />
            <Symbols text={note.symbols} />
          </Sheet>
          <Sheet title="Where it is read">
            <QueryState query={example} what="the sample recording">
              {(data) => (
                <ExampleTrace
                  example={data}
                  metricKey={metricKey}
                  read={note.read}
                  events={note.events}
                  phase={metric.phase}
                />
              )}
            </QueryState>
          </Sheet>
          <TakenAwayBy metricKey={metricKey} />
        </div>
        <div className="flex min-w-0 flex-col gap-5">
          <Sheet title="Worked example">
            <QueryState query={example} what="the sample recording">
              {(data) => (
                <>
                  <ExampleFigures example={data} metricKey={metricKey} from={note.from} />
                  <ExampleSource protocol={sample} engineVersion={data.analysis.engineVersion} />
                </>
              )}
            </QueryState>
          </Sheet>
          <AtAGlance metric={metric} />
          <Sheet title="Source">
            <p>{metric.source}.</p>
            <p className="pt-1 text-small text-ink-2">
              {evidenceWords[note.evidence]} {note.unchecked}
            </p>
          </Sheet>
          <Sheet title="Limits">
            <p>{note.limits}</p>
            {note.withoutU !== undefined && <p className="pt-1">Uncertainty: {note.withoutU}</p>}
            {touchesHealth && <CautionLine />}
          </Sheet>
        </div>
      </div>
      <div className="pt-5">
        <SettingsTable keys={note.settings} />
      </div>
    </>
  )
}

const betterWords = { higher: 'higher is better', lower: 'lower is better' } as const

function AtAGlance({ metric }: { metric: MetricDefinition }) {
  const { display, better, phase, sameFactAs, feet, protocols, key } = metric
  return (
    <Sheet title="At a glance">
      <Facts
        facts={[
          ['Unit', display.unit || 'none: a ratio'],
          ['Direction', better === null ? 'neither is better as such' : betterWords[better]],
          ['Phase', phase === null ? 'several, or none' : phaseWords[phase].toLowerCase()],
          ['Tests', protocols.map((protocol) => protocolNames[protocol]).join(', ')],
          ...(feet ? [['Feet', feetWords[feet]] as [string, string]] : []),
          ...(sameFactAs !== undefined && isMetricKey(sameFactAs)
            ? [
                [
                  'Same fact as',
                  <Link key="same" to={pathOf.method(sameFactAs)}>
                    {catalogue[sameFactAs].name}
                  </Link>,
                ] as [string, ReactNode],
              ]
            : []),
          ['Key in exports', <code key="key">{key}</code>],
        ]}
      />
    </Sheet>
  )
}

const feetWords = { also: 'both together, and each', only: 'each; needs two plates' } as const

function TakenAwayBy({ metricKey }: { metricKey: MetricKey }) {
  return (
    <Sheet title="Checks that can take it away">
      <ul className="gap-x-8 sm:columns-2">
        {checksOf(metricKey).map((check) => (
          <li key={check} className="break-inside-avoid border-b border-rule-2 py-1">
            <Link to={pathOf.method(check)}>{checkDefinitions[check].name}</Link>
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
