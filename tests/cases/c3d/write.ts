import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { format, resolveConfig } from 'prettier'
import { madeC3d } from './made.ts'

/** Writes every C3D case into its folder anew: `npx tsx tests/cases/c3d/write.ts`. */
const root = import.meta.dirname
for (const name of readdirSync(root)) if (/^\d{3}-/u.test(name)) rmSync(join(root, name), { recursive: true })
const style = await resolveConfig(join(root, 'expected.json'))
for (const { folder, bytes, expected } of madeC3d) {
  mkdirSync(join(root, folder))
  writeFileSync(join(root, folder, 'input.c3d'), bytes)
  const text = await format(JSON.stringify(expected), { ...style, parser: 'json' })
  writeFileSync(join(root, folder, 'expected.json'), text)
}
