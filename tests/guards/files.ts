import { execFileSync } from 'node:child_process'
import { existsSync } from 'node:fs'

/** Every file of the project that version control knows or would take, from the root of the checkout. */
export function projectFiles(): string[] {
  const list = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', '-z'])
  return [...new Set(list.toString().split('\0'))].filter((file) => file !== '' && existsSync(file))
}
