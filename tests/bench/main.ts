import { benchCoverage, coverageParts } from '../reference/coverage-bench.ts'
import { benchEngine } from './engine.ts'
import { benchIngest } from './ingest.ts'
import { benchMutations } from './mutations.ts'
import { benchPageWeight } from './page-weight.ts'
import { benchRecompute } from './recompute.ts'
import { benchUpload } from './upload.ts'

interface Bench {
  run: (parts: readonly string[]) => void | Promise<void>
  /** What of it can be measured alone, by name. */
  parts?: readonly string[]
}

/** What is measured, by the name that `npm run bench -- <name>` takes; parts follow it: `coverage dj hops`. */
const benches: Record<string, Bench> = {
  coverage: { run: benchCoverage, parts: coverageParts },
  engine: { run: benchEngine },
  ingest: { run: benchIngest },
  mutations: { run: benchMutations },
  'page-weight': { run: benchPageWeight },
  recompute: { run: benchRecompute },
  upload: { run: benchUpload },
}

interface Asked {
  name: string
  parts: string[]
}

function readWords(words: readonly string[]): Asked[] {
  const asked: Asked[] = []
  for (const word of words) {
    const last = asked.at(-1)
    if (word in benches) asked.push({ name: word, parts: [] })
    else if (last && benches[last.name]?.parts?.includes(word)) last.parts.push(word)
    else {
      const names = Object.entries(benches).map(([name, { parts }]) =>
        parts ? `${name} (${parts.join(', ')})` : name,
      )
      console.error(`There is no benchmark ${word}; there are ${names.join(', ')}.`)
      process.exit(1)
    }
  }
  return asked
}

const all = Object.keys(benches).map((name): Asked => ({ name, parts: [] }))
const asked = readWords(process.argv.slice(2))
for (const { name, parts } of asked.length > 0 ? asked : all) {
  console.log(`\n${name}`)
  await benches[name]?.run(parts)
}
