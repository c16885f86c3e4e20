import { benchCoverage } from '../reference/coverage.ts'
import { benchPageWeight } from './page-weight.ts'
import { benchUpload } from './upload.ts'

/** What is measured, by the name that `npm run bench -- <name>` takes. */
const benches: Record<string, () => void | Promise<void>> = {
  coverage: () => console.log(benchCoverage().table),
  'page-weight': benchPageWeight,
  upload: benchUpload,
}

const asked = process.argv.slice(2)
const unknown = asked.filter((name) => !(name in benches))
if (unknown.length > 0) {
  console.error(`There is no benchmark ${unknown.join(', ')}; there are ${Object.keys(benches).join(', ')}.`)
  process.exit(1)
}
for (const name of asked.length > 0 ? asked : Object.keys(benches)) {
  console.log(`\n${name}`)
  await benches[name]?.()
}
