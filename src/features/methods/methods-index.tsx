import { Link } from 'react-router-dom'
import { foldName } from '../../../shared/contracts/names.ts'
import { catalogue, metricKeys } from '../../../shared/mechanics/catalogue.ts'
import { checkDefinitions, checkKeys } from '../../../shared/mechanics/checks/check-definitions.ts'
import type { MetricGroup } from '../../../shared/mechanics/types.ts'
import { Button } from '../../components/button.tsx'
import { EmptyState } from '../../components/empty-state.tsx'
import { ListBar } from '../../components/list-bar.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { countOf } from '../../lib/count-of.ts'
import { pathOf } from '../../lib/paths.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { groupWords } from '../trials/event-words.ts'
import { checkNotes } from './notes/check-notes.ts'

interface Entry {
  key: string
  name: string
  unit: string
  sentence: string
}

const metricsOf = (group: MetricGroup): Entry[] =>
  metricKeys
    .filter((key) => catalogue[key].group === group)
    .map((key) => {
      const { name, display, athleteSentence } = catalogue[key]
      return { key, name, unit: display.unit, sentence: athleteSentence }
    })

const checks: Entry[] = checkKeys.map((key) => ({
  key,
  name: checkDefinitions[key].name,
  unit: '',
  sentence: checkNotes[key],
}))

const sections = [
  ...(Object.keys(groupWords) as MetricGroup[]).map((group) => ({
    title: groupWords[group],
    entries: metricsOf(group),
  })),
  { title: 'Trial checks', entries: checks },
]
const all = sections.flatMap(({ entries }) => entries)
const defaults = { search: '' }

/** Every Method note by group, found by name. */
export function MethodsIndex() {
  const [list, setList] = useListState(defaults)
  const words = foldName(list.search).split(' ')
  const fits = ({ name }: Entry) => words.every((word) => foldName(name).includes(word))
  const shown = sections
    .map(({ title, entries }) => ({ title, entries: entries.filter(fits) }))
    .filter(({ entries }) => entries.length > 0)
  return (
    <>
      <ListBar count={countOf(all.filter(fits).length, all.length, 'note')}>
        <SearchField label="Search by name" value={list.search} onChange={(search) => setList({ search })} />
      </ListBar>
      <div className="flex flex-col gap-5">
        {shown.length === 0 && (
          <Sheet flush>
            <EmptyState
              title="No note fits"
              action={<Button onClick={() => setList(defaults)}>Show all notes</Button>}
            />
          </Sheet>
        )}
        {shown.map(({ title, entries }) => (
          <Sheet key={title} title={title}>
            <ul className="gap-x-10 lg:columns-2">
              {entries.map((entry) => (
                <EntryRow key={entry.key} entry={entry} />
              ))}
            </ul>
          </Sheet>
        ))}
      </div>
    </>
  )
}

function EntryRow({ entry: { key, name, unit, sentence } }: { entry: Entry }) {
  return (
    <li className="break-inside-avoid border-b border-rule-2 py-1.5">
      <Link to={pathOf.method(key)} className="font-semibold">
        {name}
      </Link>
      {unit !== '' && <span className="text-small text-ink-2"> {unit}</span>}
      <p className="text-small text-ink-2">{sentence}</p>
    </li>
  )
}
