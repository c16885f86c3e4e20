import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import type { SessionSheet, SessionSummary, SheetTrial } from '../../../shared/contracts/sessions.ts'
import type { Analysis, Trial } from '../../../shared/contracts/trials.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { analyse } from '../../../shared/mechanics/analyse.ts'
import type { Recording } from '../../../shared/mechanics/types.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import { withheldMetrics } from '../../../shared/mechanics/withheld.ts'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import type { JumpOptions } from '../../../seed/synthetic/options.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import { idOf } from './ids.ts'

const gravity = 9.81
export const cmj = {
  protocol: 'cmj',
  side: 'both',
  externalLoadKg: 0,
  boxHeightM: null,
  arms: 'hips',
} as const

/** A jump made from physics and what the engine says of it, in the form of the API. */
export function measuredJump(jump: Partial<JumpOptions> = {}, seed = 1) {
  const noise = { whiteNoiseN: 1 }
  const recording = recordJump(makeJump(jump, seed), {}, { left: noise, right: noise }, seed)
  const [found] = analyse(recording, { test: cmj, gravity, calibrationU: {} }).trials
  if (!found) throw new Error('The engine found no jump in the fixture.')
  const { events, metrics, sides, ledger, checks, missing, notes } = found
  const analysis: Analysis = {
    id: idOf('analysis', seed),
    engineVersion: '1.0.0',
    gravity,
    events,
    movedEvents: {},
    contacts: null,
    metrics,
    withheld: withheldMetrics({ metrics, checks }),
    sides,
    ledger,
    checks,
    missing,
    notes,
  }
  return { recording, analysis }
}

/** Samples as the server sends them. */
export function samplesBody({ channels }: Recording): ArrayBuffer {
  const values = [channels.left, channels.right].flatMap((channel) => [...(channel ?? [])])
  return Int32Array.from(values, (newtons) => Math.round(newtons * 1000)).buffer
}

export function aTrial(
  { recording, analysis }: ReturnType<typeof measuredJump>,
  change: Partial<Trial> = {},
): Trial {
  return {
    id: idOf('trial', 1),
    sessionId: idOf('session', 1),
    sessionTitle: 'November jumps',
    sessionDate: '2026-11-12',
    place: 'North hall',
    uploadId: idOf('upload', 1),
    fileName: 'plate_0917.csv',
    athlete: { id: idOf('athlete', 1), name: 'Mara Ostrow' },
    placeInSession: { n: 2, of: 3 },
    test: cmj,
    setAside: null,
    recording: {
      sampleRateHz: recording.sampleRateHz,
      sampleCount: recording.channels.left?.length ?? 0,
      channels: ['left', 'right'],
      filledSamples: 0,
      timeBaseError: 0,
    },
    analysis,
    previousTrialId: null,
    nextTrialId: idOf('trial', 2),
    mayEdit: true,
    eventMoves: [],
    engineInputs: {
      engineVersion,
      test: cmj,
      recordedMassKg: null,
      gravity,
      calibrationU: {},
      changedSettings: {},
    },
    version: 1,
    ...change,
  }
}

/** A trial on the sheet that jumped so high. */
export function aSheetTrial(n: number, heightM: number, change: Partial<SheetTrial> = {}): SheetTrial {
  const metrics = Object.fromEntries(sheetMetrics.map((key) => [key, { value: 1, U: 0.1 }]))
  return {
    id: idOf('trial', n),
    uploadId: idOf('upload', n),
    fileName: `plate_${n}.csv`,
    athleteId: null,
    assignedBy: null,
    test: cmj,
    setAside: null,
    preview: [700, 700, 700, 400, 1500, 0, 0, 2400, 700, 700],
    analysis: {
      id: idOf('analysis', n),
      metrics: {
        ...metrics,
        jumpHeightImpulse: { value: heightM, U: 0.005 },
        bodyMass: { value: 74.2, U: 0.3 },
      },
      withheld: [],
      cautions: 0,
      fails: 0,
      worstSentence: null,
    },
    version: 1,
    ...change,
  }
}

export function anUpload(n: number, change: Partial<Upload> = {}): Upload {
  return {
    id: idOf('upload', n),
    sessionId: idOf('session', 1),
    fileName: `plate_${n}.csv`,
    sizeBytes: 170_000,
    state: 'read',
    error: null,
    notes: [],
    duplicateOf: null,
    archive: null,
    chunksReceived: [],
    lastReceivedAt: '2026-11-12T10:00:00.000Z',
    arriving: false,
    dismissed: null,
    trials: 1,
    uploadedByName: 'Ines Calloway',
    createdAt: '2026-11-12T10:00:00.000Z',
    version: 1,
    ...change,
  }
}

export function aSession(change: Partial<SessionSummary> = {}): SessionSummary {
  return {
    id: idOf('session', 1),
    date: '2026-11-12',
    title: 'November jumps',
    place: 'North hall',
    test: cmj,
    squadNames: ['Senior squad'],
    athletes: 2,
    trials: 3,
    inTray: 0,
    publishedAt: null,
    version: 1,
    ...change,
  }
}

/** A sheet of two athletes; the second has no trial yet. */
export function aSheet(change: Partial<SessionSheet> = {}): SessionSheet {
  const mara = idOf('athlete', 1)
  return {
    session: { ...aSession(), note: null, squadIds: [idOf('squad', 1)], publishedByName: null },
    athletes: [
      {
        athleteId: mara,
        name: 'Mara Ostrow',
        means: { jumpHeightImpulse: { value: 0.34, U: 0.01, trials: 2 } },
      },
      { athleteId: idOf('athlete', 2), name: 'Tomas Brandvold', means: {} },
    ],
    trials: [
      aSheetTrial(1, 0.335, { athleteId: mara, assignedBy: 'file-name' }),
      aSheetTrial(2, 0.345, { athleteId: mara, assignedBy: 'file-name' }),
    ],
    uploads: [anUpload(1), anUpload(2)],
    changedSincePublished: false,
    ...change,
  }
}
