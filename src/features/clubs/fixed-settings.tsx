import { useState } from 'react'
import { settingDefinitions, type SettingKey } from '../../../shared/mechanics/settings.ts'
import { numberChoices } from '../../../shared/mechanics/settings/choices.ts'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { Table, type Column } from '../../components/table.tsx'
import { settingWords } from '../methods/setting-words.ts'

const fixed = (Object.keys(settingDefinitions) as SettingKey[]).filter(
  (key) => !Object.hasOwn(numberChoices, key),
)

const columns: Column<SettingKey>[] = [
  {
    key: 'setting',
    head: 'Setting',
    cell: (key) => (
      <>
        {settingWords(key)} <code className="text-small font-normal text-ink-2">{key}</code>
      </>
    ),
  },
  { key: 'value', head: 'Value', figure: true, cell: (key) => String(settingDefinitions[key].value) },
  { key: 'unit', head: 'Unit', cell: (key) => settingDefinitions[key].unit },
  { key: 'source', head: 'Source', cell: (key) => settingDefinitions[key].source },
  { key: 'effect', head: 'What a larger value does', cell: (key) => settingDefinitions[key].effect },
]

/** What belongs to the method: shown, and the same for every club. */
export function FixedSettings() {
  const [open, setOpen] = useState(false)
  return (
    <details className="pt-4" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="cursor-pointer font-semibold">Fixed by the method ({fixed.length})</summary>
      <p className="max-w-prose py-2">
        That the intervals hold what they claim was proved with these numbers as they are: no club changes
        them.
      </p>
      {open && (
        <ScrollRegion label="Settings fixed by the method">
          <Table
            caption="Settings fixed by the method"
            columns={columns}
            rows={fixed}
            rowKey={(key) => key}
          />
        </ScrollRegion>
      )}
    </details>
  )
}
