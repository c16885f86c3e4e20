import type { ColumnMap } from './column-map.ts'

/** What somebody who knows the file says of it. It wins over nothing that the file itself says, but for the map. */
export interface ReadHints {
  /** Hz, for a file without a time column. */
  sampleRateHz?: number
  /** For forces in body weights. */
  bodyMassKg?: number
  /** Taken as it is, where the file's headings are those it was made for. */
  map?: ColumnMap
}
