import type { ForceChannel } from '../mechanics/types.ts'

/** Of a column of time: a length of time, the number of a sample (or of a frame of samples), or a time of day. */
export type TimeUnit = 's' | 'ms' | 'us' | 'min' | 'samples' | 'clock'
/** `kgf` and `lbf` are the weight of a kilogram and a pound under standard gravity; `BW` is the athlete's body weight. */
export type ForceUnit = 'N' | 'kN' | 'kgf' | 'lbf' | 'BW' | '%BW'

/** One column of the file as it was taken. `index` counts from 0; `name` is the heading as written. */
export interface MappedColumn {
  index: number
  name: string
}

export interface MappedTime extends MappedColumn {
  unit: TimeUnit
  /** Of `samples`: the column counts frames, and another one the samples within a frame. */
  within?: MappedColumn & { samplesPerFrame: number }
}

export interface MappedForce extends MappedColumn {
  unit: ForceUnit
  /** Columns of one channel are added up. */
  channel: ForceChannel
  /** Pressing on the plate reads negative. */
  downward?: true
}

/** How the columns of one kind of file are read: data that a person can confirm, change and keep. */
export interface ColumnMap {
  /** null: the file has no time; the rate is stated. */
  time: MappedTime | null
  forces: MappedForce[]
  /** Hz, as a person confirmed it for files that do not state it themselves. */
  sampleRateHz?: number
}
