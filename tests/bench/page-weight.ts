import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'
import { ensureClient } from '../../server/setup/client-build.mjs'

const clientFolder = 'dist/client'
const entry = 'index.html'
const athletePage = 'src/pages/me.tsx'
/** kB (1000 bytes) of compressed script that the athlete's first page may ask a phone to load. */
const mostKb = 180

type Manifest = Record<string, { file: string; imports?: string[] }>

/** The scripts that a chunk needs before it can run, itself included. */
function withImports(manifest: Manifest, key: string, found = new Set<string>()): Set<string> {
  const chunk = manifest[key]
  if (!chunk) throw new Error(`The build knows no ${key}.`)
  if (found.has(chunk.file)) return found
  found.add(chunk.file)
  for (const imported of chunk.imports ?? []) withImports(manifest, imported, found)
  return found
}

/** Prints the script that the athlete's first page loads, each file compressed as the server sends it at worst. */
export async function benchPageWeight(): Promise<void> {
  await ensureClient()
  const manifest = JSON.parse(readFileSync(join(clientFolder, '.vite/manifest.json'), 'utf8')) as Manifest
  const files = withImports(manifest, athletePage, withImports(manifest, entry))
  const scripts = [...files].filter((file) => file.endsWith('.js'))
  const weights = scripts.map((file) => gzipSync(readFileSync(join(clientFolder, file))).length)
  const kb = weights.reduce((sum, weight) => sum + weight, 0) / 1000
  const ratio = kb / mostKb
  console.log(`athlete's first page: ${kb.toFixed(1)} kB of script, gzip (${scripts.length} files)`)
  console.log(`limit ${mostKb} kB, ratio ${ratio.toFixed(2)}: ${ratio < 1 ? 'kept' : 'MISSED'}`)
}
