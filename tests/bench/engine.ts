import { analyse } from '../../shared/mechanics/analyse.ts'
import type { AnalyseOptions, Recording } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import { sampled } from '../setup/closed-form-cmj.ts'
import { whiteNoise } from '../setup/white-noise.ts'

const recordings = 50
const warmUps = 3000
const rounds = 4000
const options: AnalyseOptions = {
  gravity: standardGravity,
  calibrationU: { left: 0.005, right: 0.005 },
  test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
}

/** Jumps of 8 s at 1000 Hz on two plates with 3 N of noise each; the last with one second more of stance in front. */
function drawRecordings(durationS: number): Recording[] {
  return Array.from({ length: recordings }, (_, k) => {
    const noise = whiteNoise(k + 1)
    return sampled({
      durationS,
      startS: -0.013 * k,
      channels: 'feet',
      shareLeft: 0.45 + 0.002 * k,
      disturb: (force) => force + 3 * noise(),
    })
  })
}

function quantile(sorted: Float64Array, share: number): string {
  return `${(sorted[Math.floor(share * (sorted.length - 1))] * 1000).toFixed(0)} µs`
}

/** Times one analysis after another in this process and gives the median and the fastest tenth. */
function time(from: Recording[], uncertainty: boolean, count: number): Float64Array {
  const asked = { ...options, uncertainty }
  for (let k = 0; k < Math.min(warmUps, count); k++) analyse(from[k % from.length], asked)
  const times = new Float64Array(count)
  for (let k = 0; k < count; k++) {
    const start = performance.now()
    analyse(from[k % from.length], asked)
    times[k] = performance.now() - start
  }
  return times.sort()
}

/**
 * The engine alone, warm, on one core: from the arrays of a recording to every figure, check and ledger entry.
 * Target: median under 500 µs without and 700 µs with uncertainty; 60 s at most nine times the 8 s.
 */
export async function benchEngine(): Promise<void> {
  const usual = drawRecordings(8)
  const long = drawRecordings(60)
  console.log('Engine alone, two plates at 1000 Hz, warm, one core: median (fastest tenth)')
  const medians = [false, true].map((uncertainty) => {
    const times = time(usual, uncertainty, rounds)
    const name = uncertainty ? 'with uncertainty' : 'without uncertainty'
    console.log(`  8 s, ${name}: ${quantile(times, 0.5)} (${quantile(times, 0.1)})`)
    return times[times.length >> 1]
  })
  const sixty = time(long, true, 300)
  const ratio = sixty[sixty.length >> 1] / medians[1]
  console.log(
    `  60 s, with uncertainty: ${quantile(sixty, 0.5)} (${quantile(sixty, 0.1)}), ${ratio.toFixed(1)} times the 8 s`,
  )
  console.log(`  uncertainty costs ${(medians[1] / medians[0]).toFixed(2)} times the plain analysis`)
}
