import { useState } from 'react'
import type { z } from 'zod'
import { newerRow } from './newer-row.ts'

interface StaleRow<Row> {
  /** As the form was opened; stays so while others save, so that what they changed can be shown. */
  opened: Row
  /** As it stands now, once a save was refused for it. */
  newer: Row | null
  /** The version to save over: the newest that the person has been shown. */
  version: number
  /** Remembers the newer row of a refusal; throws every other error on. */
  catchStale: (error: unknown) => void
  takeTheirs: () => void
  /** After a save, where the form stays open: the saved row is what the next one starts from. */
  startFrom: (saved: Row) => void
}

/** The row behind a form that somebody else may save first. */
export function useStaleRow<S extends z.ZodType<{ version: number }>>(
  row: z.output<S>,
  schema: S,
): StaleRow<z.output<S>> {
  const [opened, setOpened] = useState(row)
  const [newer, setNewer] = useState<z.output<S> | null>(null)
  return {
    opened,
    newer,
    version: (newer ?? opened).version,
    catchStale(error) {
      const found = newerRow(error, schema)
      if (found === null) throw error
      setNewer(found)
    },
    takeTheirs() {
      if (newer !== null) setOpened(newer)
      setNewer(null)
    },
    startFrom(saved) {
      setOpened(saved)
      setNewer(null)
    },
  }
}
