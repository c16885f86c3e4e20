import type { SettingKey } from '../../../shared/mechanics/settings.ts'

/** What a key's last letters say of its unit stands in the unit already. */
const suffix = /(?:N|S|M|Hz|U|Sd)$/
const kept: Record<string, string> = { U: ' uncertainty', Sd: ' SD' }

/** "landing search" of `landingSearchS`: a setting's key in words. */
export function settingWords(key: SettingKey): string {
  const [unit = ''] = suffix.exec(key) ?? []
  const words = key.replace(suffix, '').replace(/[A-Z]|\d+/g, (letter) => ` ${letter.toLowerCase()}`)
  return words + (kept[unit] ?? '')
}
