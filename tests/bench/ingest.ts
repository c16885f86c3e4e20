import { spawn } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { fileStyle } from '../../seed/synthetic/file-styles.ts'
import { makeJump } from '../../seed/synthetic/jump.ts'
import { seededRandom } from '../../seed/synthetic/random.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { AnalyseOptions } from '../../shared/mechanics/types.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { standardGravity } from '../../shared/units/gravity.ts'

const FILES = 200
const ROUNDS = 9
/** Debian's own Python, with the packages that .ci/run installs. */
const python = '/usr/bin/python3'
const script = join(import.meta.dirname, 'ingest-baseline.py')
/** Files a second against each way, at least. */
const targets = { pandas: 3, numpy: 1.7 } as const

const options: AnalyseOptions = {
  gravity: standardGravity,
  calibrationU: { left: 0.005, right: 0.005 },
  test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
}

interface Spent {
  clockS: number
  processorS: number
  meanVelocity: number
  files: number
}
type Way = 'ours' | keyof typeof targets

/** Countermovement jumps of 8 s on two plates at 1000 Hz, 3 N of noise on each, as text with three decimals. */
function writeFiles(folder: string): string[] {
  const noise = { whiteNoiseN: 3 }
  const random = seededRandom(FILES)
  return Array.from({ length: FILES }, (_, k) => {
    const jump = makeJump(
      { takeoffVelocity: random.between(1.8, 3.2), massKg: random.between(50, 110) },
      k + 1,
    )
    const recording = recordJump(jump, { durationS: 8 }, { left: noise, right: noise }, k + 1)
    const path = join(folder, `jump-${String(k).padStart(3, '0')}.csv`)
    writeFileSync(path, writeDelimited(recording, fileStyle({ forceDecimals: 3 })))
    return path
  })
}

/** From the bytes on disk to every metric with its uncertainty, file by file in this process. */
function ours(paths: readonly string[]): Spent {
  const start = performance.now()
  const before = process.cpuUsage()
  let velocities = 0
  for (const path of paths) {
    const read = readRecording(readFileSync(path), 'jump.csv')
    const [trial] = read.ok ? analyse(read.recording, options).trials : []
    const velocity = trial?.metrics.takeoffVelocity
    if (!velocity || velocity.U === null) throw new Error(`No takeoff velocity was found in ${path}.`)
    velocities += velocity.value
  }
  const { user, system } = process.cpuUsage(before)
  return {
    clockS: (performance.now() - start) / 1000,
    processorS: (user + system) / 1e6,
    meanVelocity: velocities / paths.length,
    files: paths.length,
  }
}

/** The script in Python, which works through the folder once for each line it is sent. */
function startPython(folder: string): { run: (parser: string) => Promise<Spent>; stop: () => void } {
  const child = spawn(python, ['-I', script, folder], { stdio: ['pipe', 'pipe', 'inherit'] })
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]()
  return {
    run: async (parser) => {
      child.stdin.write(`${parser}\n`)
      const { value, done } = await lines.next()
      if (done) throw new Error(`${script} ended: are Debian’s python3-pandas and python3-scipy there?`)
      const spent = JSON.parse(value) as Spent
      if (spent.files !== FILES) throw new Error(`${script} worked through ${spent.files} files.`)
      return spent
    },
    stop: () => child.stdin.end(),
  }
}

const median = (values: number[]): number => values.toSorted((a, b) => a - b)[values.length >> 1] ?? NaN

interface Pace {
  /** Files a second, by the medians of the rounds. */
  clock: number
  processor: number
  /** Of the fastest round by the clock: what a machine that does other things meanwhile tells best. */
  fastest: number
}

function paceOf(spent: Spent[]): Pace {
  const clocks = spent.map(({ clockS }) => clockS)
  return {
    clock: FILES / median(clocks),
    processor: FILES / median(spent.map(({ processorS }) => processorS)),
    fastest: FILES / Math.min(...clocks),
  }
}

function show(name: string, spent: Spent[]): Pace {
  const pace = paceOf(spent)
  const { clock, processor, fastest } = pace
  console.log(
    `  ${name.padEnd(28)}${clock.toFixed(0).padStart(6)} files/s; fastest round ${fastest.toFixed(0)}, by the processor ${processor.toFixed(0)}; mean takeoff velocity ${spent[0]?.meanVelocity.toFixed(4) ?? ''} m/s`,
  )
  return pace
}

/**
 * Bytes to all metrics with uncertainty on 200 files of 8 s, one core, against pandas + SciPy and numpy + SciPy on the
 * same files in the same run: the three take turns, and the medians of their rounds are compared.
 */
export async function benchIngest(): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'underfoot-ingest-'))
  const paths = writeFiles(folder)
  const baseline = startPython(folder)
  try {
    const spent: Record<Way, Spent[]> = { ours: [], pandas: [], numpy: [] }
    // One round of each to warm up.
    for (let round = 0; round <= ROUNDS; round++) {
      const now = {
        ours: ours(paths),
        pandas: await baseline.run('pandas'),
        numpy: await baseline.run('numpy'),
      }
      if (round > 0) for (const way of ['ours', 'pandas', 'numpy'] as const) spent[way].push(now[way])
    }
    console.log(`  ${FILES} files of 8 s, two plates at 1000 Hz, medians of ${ROUNDS} rounds, warm, one core`)
    const mine = show('read, analyse, uncertainty', spent.ours)
    for (const way of ['pandas', 'numpy'] as const) {
      const theirs = show(`${way} + SciPy, figures only`, spent[way])
      const times = (of: keyof Pace): string => (mine[of] / theirs[of]).toFixed(2)
      const met = mine.clock >= targets[way] * theirs.clock
      if (!met) process.exitCode = 1
      console.log(
        `    ${times('clock')} times ${way} + SciPy (fastest rounds ${times('fastest')}, by the processor ${times('processor')}); target ${targets[way]}: ${met ? 'met' : 'MISSED'}`,
      )
    }
  } finally {
    baseline.stop()
    rmSync(folder, { recursive: true })
  }
}
