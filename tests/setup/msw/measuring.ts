import {
  changeMeasuringSettings,
  changePlateCalibration,
  getMeasuringSettings,
  getPlateCalibration,
  type MeasuringSettings,
  type PlateCalibration,
} from '../../../shared/contracts/measuring.ts'
import {
  cancelRecompute,
  getRecompute,
  getStanding,
  listRecomputes,
  startRecompute,
  type Recompute,
  type RecomputeReport,
} from '../../../shared/contracts/recomputes.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import { answer, Refusal } from './answer.ts'
import { idOf } from './ids.ts'

export interface MeasuringState {
  settings: MeasuringSettings
  plates: PlateCalibration
  /** Of how many analyses, and how many were made otherwise. */
  total: number
  stale: number
  recomputes: Recompute[]
  reports: Record<string, RecomputeReport>
}

const change = { byName: 'Wanda Crest', at: '2027-02-01T10:00:00.000Z' }

/** What a club's analyses are made with, and its recomputes, as the server keeps them. */
export function inventedMeasuring(start: Partial<MeasuringState> = {}) {
  const calibrationU = { left: 0.005, right: 0.005, single: 0.005, total: 0.005 }
  const state: MeasuringState = {
    settings: { changed: {}, version: 1, change: null },
    plates: { calibrationU, place: null, gravity: 9.80665, version: 1, change: null },
    total: 12,
    stale: 0,
    recomputes: [],
    reports: {},
    ...start,
  }
  return { measuring: state, handlers: [...editionHandlers(state), ...recomputeHandlers(state)] }
}

const isOpen = ({ state }: Recompute) => state === 'waiting' || state === 'running'

function editionHandlers(state: MeasuringState) {
  const refuseStale = (row: { version: number }, version: number) => {
    if (row.version !== version)
      throw new Refusal('stale-version', 409, 'Somebody changed this since you opened it.', { newer: row })
  }
  return [
    answer(getMeasuringSettings, () => state.settings),
    answer(changeMeasuringSettings, ({ body: { changed, version } }) => {
      refuseStale(state.settings, version)
      state.stale = state.total
      state.settings = { changed, version: version + 1, change }
      return state.settings
    }),
    answer(getPlateCalibration, () => state.plates),
    answer(changePlateCalibration, ({ body: { version, ...stated } }) => {
      refuseStale(state.plates, version)
      state.stale = state.total
      state.plates = { ...state.plates, ...stated, version: version + 1, change }
      return state.plates
    }),
  ]
}

function recomputeHandlers(state: MeasuringState) {
  const one = (id: string) => {
    const found = state.recomputes.find((recompute) => recompute.id === id)
    if (!found) throw new Refusal('not-found', 404, 'This is not here.')
    return found
  }
  return [
    answer(getStanding, () => ({
      engineVersion,
      total: state.total,
      stale: state.stale,
      otherEngine: 0,
      otherSettings: state.stale,
      otherPlates: 0,
      open: state.recomputes.find(isOpen) ?? null,
    })),
    answer(listRecomputes, () => ({ recomputes: state.recomputes })),
    answer(getRecompute, ({ params }) => ({
      recompute: one(params.recomputeId),
      report: state.reports[params.recomputeId] ?? null,
    })),
    answer(startRecompute, ({ body: { scope, dryRun } }) => {
      const recompute: Recompute = {
        id: idOf('recompute', state.recomputes.length + 1),
        scope,
        scopeName: null,
        dryRun,
        state: 'waiting',
        total: state.stale,
        done: 0,
        engineVersion,
        requestedByName: 'Wanda Crest',
        requestedAt: '2027-02-01T10:00:00.000Z',
        finishedAt: null,
      }
      state.recomputes.unshift(recompute)
      return recompute
    }),
    answer(cancelRecompute, ({ params }) => Object.assign(one(params.recomputeId), { state: 'cancelled' })),
  ]
}
