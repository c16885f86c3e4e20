import { mkdirSync, writeFileSync } from 'node:fs'
import { sampleFiles } from './sample-files.ts'

/** Writes the sample files anew: `node --import tsx seed/samples/write-samples.ts`. */
const folder = 'public/samples'
mkdirSync(folder, { recursive: true })
for (const [name, bytes] of Object.entries(sampleFiles())) writeFileSync(`${folder}/${name}`, bytes)
