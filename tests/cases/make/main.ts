import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { format, resolveConfig } from 'prettier'
import { madeCases } from './all.ts'

/** Writes every made case into its folder anew: `npx tsx tests/cases/make/main.ts`. Cases below 101 are kept by hand. */
const root = join(import.meta.dirname, '..')
for (const name of readdirSync(root))
  if (/^[1-9]\d{2}-/u.test(name)) rmSync(join(root, name), { recursive: true })
const style = await resolveConfig(join(root, 'expected.json'))
for (const { folder, bytes, extension = 'csv', expected } of madeCases) {
  mkdirSync(join(root, folder))
  writeFileSync(join(root, folder, `input.${extension}`), bytes)
  writeFileSync(
    join(root, folder, 'expected.json'),
    await format(JSON.stringify(expected), { ...style, parser: 'json' }),
  )
}
