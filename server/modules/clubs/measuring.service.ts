import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import {
  type changeMeasuringSettings,
  type changePlateCalibration,
  type MeasuringSettings,
  type PlateCalibration,
  unknownPlateU,
} from '../../../shared/contracts/measuring.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import { onlyChanged } from '../../../shared/mechanics/settings/choices.ts'
import { gravityAt, standardGravity } from '../../../shared/units/gravity.ts'
import type { Tx } from '../../db/database.ts'
import type { MadeWith } from '../../db/schema/recomputes.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import {
  type CalibrationRow,
  findMeasuringSettings,
  findPlateCalibration,
  insertMeasuringSettings,
  insertPlateCalibration,
} from './measuring.queries.ts'

/** Refuses a change at a time when it must not be. */
export type Guard = (tx: Tx, clubId: string) => Promise<void>

export const readMeasuringSettings = ({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<MeasuringSettings> =>
  db.inClub(ctx, (tx) => viewSettings(tx, ctx.clubId))

export const readPlateCalibration = ({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<PlateCalibration> =>
  db.inClub(ctx, (tx) => viewCalibration(tx, ctx.clubId))

/** A new edition of the settings. What was analysed before stays until somebody recomputes it. */
export function editMeasuringSettings(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  { changed, version }: BodyOf<typeof changeMeasuringSettings>,
  guard: Guard,
): Promise<MeasuringSettings> {
  const { clubId, personId: changedBy } = ctx
  return db.inClub(ctx, async (tx) => {
    await guard(tx, clubId)
    const before = await viewSettings(tx, clubId)
    const row = { clubId, edition: version + 1, changed: onlyChanged(changed), changedBy }
    if (before.version !== version || !(await insertMeasuringSettings(tx, row)))
      throw staleVersion(await viewSettings(tx, clubId))
    await record(tx, ctx, 'club.measuring-settings', 'club', clubId, {
      edition: row.edition,
      changed: row.changed,
    })
    await notify(tx, clubId, { kind: 'recomputes', id: null })
    return viewSettings(tx, clubId)
  })
}

/** A new edition of how far the plates are to be trusted and where they stand. */
export function editPlateCalibration(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  { calibrationU, place, version }: BodyOf<typeof changePlateCalibration>,
  guard: Guard,
): Promise<PlateCalibration> {
  const { clubId, personId: changedBy } = ctx
  const { left: leftU, right: rightU, single: singleU, total: totalU } = calibrationU
  const { latitudeDeg, altitudeM } = place ?? { latitudeDeg: null, altitudeM: null }
  const stated = { leftU, rightU, singleU, totalU, latitudeDeg, altitudeM }
  return db.inClub(ctx, async (tx) => {
    await guard(tx, clubId)
    const before = await viewCalibration(tx, clubId)
    const row = { clubId, edition: version + 1, changedBy, ...stated }
    if (before.version !== version || !(await insertPlateCalibration(tx, row)))
      throw staleVersion(await viewCalibration(tx, clubId))
    await record(tx, ctx, 'club.plate-calibration', 'club', clubId, { edition: row.edition, ...stated })
    await notify(tx, clubId, { kind: 'recomputes', id: null })
    return viewCalibration(tx, clubId)
  })
}

/** What an analysis made now is made with, besides the trial's own facts. */
export async function madeWithNow(tx: Tx, clubId: string): Promise<MadeWith> {
  const { changed } = await viewSettings(tx, clubId)
  const { calibrationU, gravity } = await viewCalibration(tx, clubId)
  return {
    settings: `default-${defaultSettings.version}`,
    ...(Object.keys(changed).length > 0 ? { changedSettings: changed } : {}),
    gravity,
    calibrationU,
  }
}

const firstEdition = { version: 1, change: null }
const editionOf = ({ edition, byName, at }: { edition: number; byName: string | null; at: Date }) => ({
  version: edition,
  change: { byName: byName ?? '', at: at.toISOString() },
})

async function viewSettings(tx: Tx, clubId: string): Promise<MeasuringSettings> {
  const row = await findMeasuringSettings(tx, clubId)
  return row ? { changed: row.changed, ...editionOf(row) } : { changed: {}, ...firstEdition }
}

async function viewCalibration(tx: Tx, clubId: string): Promise<PlateCalibration> {
  const row = await findPlateCalibration(tx, clubId)
  if (row) return { ...calibrationOf(row), ...editionOf(row) }
  const [left, right, single, total] = [unknownPlateU, unknownPlateU, unknownPlateU, unknownPlateU]
  return {
    calibrationU: { left, right, single, total },
    place: null,
    gravity: standardGravity,
    ...firstEdition,
  }
}

function calibrationOf({ leftU, rightU, singleU, totalU, latitudeDeg, altitudeM }: CalibrationRow) {
  const place = latitudeDeg === null || altitudeM === null ? null : { latitudeDeg, altitudeM }
  return {
    calibrationU: { left: leftU, right: rightU, single: singleU, total: totalU },
    place,
    gravity: place ? gravityAt(place.latitudeDeg, place.altitudeM) : standardGravity,
  }
}
