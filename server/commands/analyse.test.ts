import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { catalogue, metricKeys } from '../../shared/mechanics/catalogue.ts'
import { defaultSettings } from '../../shared/mechanics/settings.ts'
import { fileEntry } from './analysis-document.ts'
import { summaryLines } from './analysis-summary.ts'

const folder = 'public/samples'
const entryOf = (name: string): ReturnType<typeof fileEntry> =>
  fileEntry(`${folder}/${name}`, readFileSync(`${folder}/${name}`), {}, defaultSettings)

/** Runs the command as a person does. */
function run(...args: string[]): { status: number | null; stdout: string; stderr: string } {
  const command = ['--import', 'tsx', 'server/commands/analyse.ts', ...args]
  const { status, stdout, stderr } = spawnSync(process.execPath, command, { encoding: 'utf8' })
  return { status, stdout, stderr }
}

describe('the entry of a file', () => {
  const entry = entryOf('two-plates.csv')
  const [trial] = entry.trials

  it('says what was read and how', () => {
    const bytes = readFileSync(`${folder}/two-plates.csv`)
    expect(entry).toMatchObject({
      file: 'public/samples/two-plates.csv',
      sha256: createHash('sha256').update(bytes).digest('hex'),
      format: { kind: 'delimited', delimiter: ',', headerLine: 2 },
      sampleRateHz: 1000,
      durationS: 6,
    })
    expect(entry.notes.map((note) => note.code)).toStrictEqual(['lines-before-header', 'test-proposed'])
  })

  it('gives every figure the unit of the catalogue', () => {
    expect(Object.keys(trial?.metrics ?? {}).length).toBeGreaterThan(40)
    for (const key of metricKeys) {
      const figure = trial?.metrics[key]
      if (figure) expect(figure.unit).toBe(catalogue[key].unit)
    }
    expect(trial?.metrics.takeoffVelocity).toMatchObject({
      unit: 'm/s',
      k: expect.any(Number),
      URepeat: expect.any(Number),
    })
    expect(trial?.sides?.left.landingPeakForce?.unit).toBe('N')
    expect(trial?.sides?.asymmetry.landingPeakForce?.unit).toBe('%')
    expect(trial?.ledger?.closing).toMatchObject({ unit: 'N·s', closes: true })
  })

  it('holds nothing that JSON cannot', () => {
    expect(JSON.parse(JSON.stringify(entry))).toStrictEqual(entry)
  })

  it('has no sides where there is one plate, and says what failed where the athlete stepped off', () => {
    expect(entryOf('one-plate-tabs.csv').trials[0]?.sides).toBeNull()
    const failed = entryOf('stepped-off.csv').trials[0]?.checks.filter((check) => check.verdict === 'fail')
    expect(failed?.length).toBeGreaterThan(0)
  })

  it('is the error where the file is no recording', () => {
    const none = fileEntry('notes.txt', new TextEncoder().encode('no numbers here'), {}, defaultSettings)
    expect(none).toMatchObject({ error: { code: 'not-a-recording' }, trials: [], sampleRateHz: null })
    expect(summaryLines(none)[0]).toContain('notes.txt: The file is text without numbers')
  })

  it('has no trial and says so where nobody jumps', () => {
    const text = `Time (s),Force (N)\n${Array.from({ length: 3000 }, (_, i) => `${i / 1000},${700 + (i % 3)}`).join('\n')}`
    const standing = fileEntry('standing.csv', new TextEncoder().encode(text), {}, defaultSettings)
    expect(standing.trials).toStrictEqual([])
    expect(standing.notes.map((note) => note.code)).toContain('no-trial-found')
  })
})

/** A process of its own starts in one to two seconds, and in more where everything runs at once. */
const forAProcess = { timeout: 30_000 }

describe('npm run analyse', forAProcess, () => {
  it('prints the document of the sample files and ends with 0', () => {
    const { status, stdout } = run(`${folder}/two-plates.csv`, `${folder}/one-plate-tabs.csv`)
    const document = JSON.parse(stdout) as { engineVersion: string; settings: unknown; files: unknown[] }
    expect(status).toBe(0)
    expect(document.settings).toStrictEqual(defaultSettings)
    expect(document.files).toStrictEqual([entryOf('two-plates.csv'), entryOf('one-plate-tabs.csv')])
  })

  it('reads the others past a file that is bad or missing, and ends with 2', () => {
    const { status, stdout } = run(
      'tests/cases/036-empty/input.csv',
      'no-such-file.csv',
      `${folder}/two-plates.csv`,
    )
    const { files } = JSON.parse(stdout) as { files: { error?: { code: string }; trials: unknown[] }[] }
    expect(status).toBe(2)
    expect(files.map((file) => file.error?.code)).toStrictEqual(['empty-file', 'file-unreadable', undefined])
    expect(files[2]?.trials).toHaveLength(1)
  })

  it('says how it goes when it is not understood, and ends with 1', () => {
    const { status, stdout, stderr } = run('--colour')
    expect([status, stdout]).toStrictEqual([1, ''])
    expect(stderr).toContain('Usage: npm run --silent analyse')
  })
})
