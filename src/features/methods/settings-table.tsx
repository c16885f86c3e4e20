import { defaultSettings, settingDefinitions, type SettingKey } from '../../../shared/mechanics/settings.ts'
import { Sheet } from '../../components/sheet.tsx'
import { Table, type Column } from '../../components/table.tsx'
import { settingWords } from './setting-words.ts'

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

/** The settings in force that a figure or a check rests on. */
export function SettingsTable({ keys }: { keys: readonly SettingKey[] }) {
  if (keys.length === 0) return null
  return (
    <Sheet title="Settings in force" titleAside={`version ${defaultSettings.version}`} flush>
      <Table caption="Settings in force" columns={columns} rows={[...new Set(keys)]} rowKey={(key) => key} />
      {keys.includes('onsetFraction') && (
        <p className="px-3 py-2 text-small text-ink-2">
          The onset goes by a{' '}
          {defaultSettings.onsetRule === 'fraction'
            ? 'fraction of the weight'
            : 'number of standard deviations of the weighing'}{' '}
          (<code>onsetRule</code>).
        </p>
      )}
    </Sheet>
  )
}
