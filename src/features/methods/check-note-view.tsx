import { Link } from 'react-router-dom'
import { catalogue, metricKeys } from '../../../shared/mechanics/catalogue.ts'
import { checkDefinitions, type CheckKey } from '../../../shared/mechanics/checks/check-definitions.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'
import { Facts } from '../../components/facts.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { pathOf, paths } from '../../lib/paths.ts'
import { formatMeasured } from '../trials/format-measured.ts'
import { groupWords } from '../trials/event-words.ts'
import { ExampleSource } from './example-source.tsx'
import { checkNotes } from './notes/check-notes.ts'
import { sampleOfCheck } from './sample-of.ts'
import { SettingsTable } from './settings-table.tsx'
import { useWorkedExample } from './use-worked-example.ts'
import type { WorkedExample } from './worked-example.ts'

/** The Method note of a Trial check: what is measured, what it takes away, what to do. */
export function CheckNoteView({ checkKey }: { checkKey: CheckKey }) {
  const { name, affects, remedy, settings } = checkDefinitions[checkKey]
  const sample = sampleOfCheck(checkKey)
  const example = useWorkedExample(sample)
  return (
    <>
      <PageHead
        title={name}
        context={
          <>
            <Link to={paths.methods}>Methods</Link> · Trial checks
          </>
        }
      />
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="flex min-w-0 flex-col gap-5">
          <Sheet title="What is measured">
            <p className="max-w-prose">{checkNotes[checkKey]}</p>
          </Sheet>
          <Sheet title="What to do">
            <p>{remedy}</p>
          </Sheet>
          <Sheet title="What it affects">
            <p className="max-w-prose pb-2 text-ink-2">
              A failure takes these figures away: they stay out of means, trends and flags, and are shown
              struck. A caution leaves them standing.
            </p>
            {affects.map((group) => (
              <details key={group} className="border-b border-rule-2 py-1.5">
                <summary className="cursor-pointer">{groupWords[group]}</summary>
                <ul className="gap-x-8 text-small sm:columns-2">
                  {metricKeys
                    .filter((key) => catalogue[key].group === group)
                    .map((key) => (
                      <li key={key} className="py-0.5">
                        <Link to={pathOf.method(key)}>{catalogue[key].name}</Link>
                      </li>
                    ))}
                </ul>
              </details>
            ))}
          </Sheet>
        </div>
        <Sheet title="Worked example">
          <QueryState query={example} what="the sample recording">
            {(data) => <ExampleOfCheck example={data} checkKey={checkKey} sample={sample} />}
          </QueryState>
        </Sheet>
      </div>
      <div className="pt-5">
        <SettingsTable keys={settings} />
      </div>
    </>
  )
}

const verdictWords = { pass: 'passes', caution: 'caution: look at it', fail: 'fails' } as const

interface ExampleProps {
  example: WorkedExample
  checkKey: CheckKey
  sample: Protocol
}

function ExampleOfCheck({ example: { analysis }, checkKey, sample }: ExampleProps) {
  const check = analysis.checks.find(({ key }) => key === checkKey)
  return (
    <>
      {check ? (
        <>
          <p className="pb-1">{check.sentence}</p>
          <Facts
            facts={[
              ['Verdict', verdictWords[check.verdict]],
              ['Measured', check.measured === null ? 'nothing' : formatMeasured(check.measured, check.unit)],
              ['Limit', check.limit === null ? 'none' : formatMeasured(check.limit, check.unit)],
            ]}
          />
        </>
      ) : (
        <p>The sample does not call for this check: it comes with no recorded mass.</p>
      )}
      <ExampleSource protocol={sample} engineVersion={analysis.engineVersion} />
    </>
  )
}
