import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { foldName } from '../../../shared/contracts/names.ts'
import { SearchField } from '../../components/search-field.tsx'
import { TickList } from '../../components/tick-list.tsx'
import { counted } from '../../lib/counted.ts'
import { compareText } from '../../lib/sort-rows.ts'

interface MemberPickerProps {
  athletes: Athlete[]
  search: string
  onSearch: (search: string) => void
  chosen: string[]
  onChange: (athleteIds: string[]) => void
}

/** The squad's members out of all athletes; a search narrows what is listed and never what is chosen. */
export function MemberPicker({ athletes, search, onSearch, chosen, onChange }: MemberPickerProps) {
  const listed = athletes
    .filter(({ id, archived }) => !archived || chosen.includes(id))
    .filter(({ name }) => foldName(name).includes(foldName(search)))
    .sort((a, b) => compareText(a.name, b.name))
  return (
    <div className="flex flex-col gap-3">
      <SearchField label="Find an athlete" value={search} onChange={onSearch} />
      <TickList
        label="Members"
        hint={`${counted(chosen.length, 'athlete')} chosen`}
        items={listed.map(({ id, name, archived }) => ({
          id,
          words: archived ? `${name} (archived)` : name,
        }))}
        none={
          athletes.length === 0
            ? 'The club has no athletes yet. A squad may start empty.'
            : 'No athlete of that name.'
        }
        chosen={chosen}
        onChange={onChange}
      />
    </div>
  )
}
