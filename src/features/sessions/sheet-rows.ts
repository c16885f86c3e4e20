import type { SessionSheet, SheetTrial } from '../../../shared/contracts/sessions.ts'

export interface SheetRow {
  athlete: SessionSheet['athletes'][number]
  trials: SheetTrial[]
}

/** The sheet as rows: athletes down, each with their trials in the order they came; the Tray holds the others. */
export function sheetRows(sheet: Pick<SessionSheet, 'athletes' | 'trials'>): {
  rows: SheetRow[]
  columns: number
  tray: SheetTrial[]
} {
  const byAthlete = group(sheet.trials)
  const rows = sheet.athletes.map((athlete) => ({ athlete, trials: byAthlete.get(athlete.athleteId) ?? [] }))
  const columns = Math.max(1, ...rows.map((row) => row.trials.length))
  return { rows, columns, tray: byAthlete.get(null) ?? [] }
}

export interface SheetCounts {
  trials: number
  setAside: number
  inTray: number
  unanalysed: number
  /** What a publication now would show, and to how many. */
  toPublish: { athletes: number; trials: number }
}

export function sheetCounts({ trials }: Pick<SessionSheet, 'trials'>): SheetCounts {
  const included = trials.filter(
    (trial) => trial.athleteId !== null && trial.setAside === null && trial.analysis,
  )
  return {
    trials: trials.length,
    setAside: trials.filter((trial) => trial.setAside !== null).length,
    inTray: trials.filter((trial) => trial.athleteId === null).length,
    unanalysed: trials.filter((trial) => trial.analysis === null).length,
    toPublish: { athletes: new Set(included.map((trial) => trial.athleteId)).size, trials: included.length },
  }
}

function group(trials: readonly SheetTrial[]): Map<string | null, SheetTrial[]> {
  const groups = new Map<string | null, SheetTrial[]>()
  for (const trial of trials) {
    const group = groups.get(trial.athleteId)
    if (group) group.push(trial)
    else groups.set(trial.athleteId, [trial])
  }
  return groups
}
