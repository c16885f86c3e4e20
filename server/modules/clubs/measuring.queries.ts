import { desc, eq } from 'drizzle-orm'
import type { ChangedSettings } from '../../../shared/mechanics/settings/choices.ts'
import type { Tx } from '../../db/database.ts'
import { people } from '../../db/schema/identity.ts'
import { measuringSettings, plateCalibrations } from '../../db/schema/measuring.ts'

/** The newest edition of the settings; null where the club never changed any. */
export async function findMeasuringSettings(tx: Tx, clubId: string) {
  const [row] = await tx
    .select({
      edition: measuringSettings.edition,
      changed: measuringSettings.changed,
      at: measuringSettings.createdAt,
      byName: people.name,
    })
    .from(measuringSettings)
    .leftJoin(people, eq(people.id, measuringSettings.changedBy))
    .where(eq(measuringSettings.clubId, clubId))
    .orderBy(desc(measuringSettings.edition))
    .limit(1)
  return row ?? null
}

/** The newest edition of the calibration; null where the club never stated any. */
export async function findPlateCalibration(tx: Tx, clubId: string) {
  const [row] = await tx
    .select({
      edition: plateCalibrations.edition,
      leftU: plateCalibrations.leftU,
      rightU: plateCalibrations.rightU,
      singleU: plateCalibrations.singleU,
      totalU: plateCalibrations.totalU,
      latitudeDeg: plateCalibrations.latitudeDeg,
      altitudeM: plateCalibrations.altitudeM,
      at: plateCalibrations.createdAt,
      byName: people.name,
    })
    .from(plateCalibrations)
    .leftJoin(people, eq(people.id, plateCalibrations.changedBy))
    .where(eq(plateCalibrations.clubId, clubId))
    .orderBy(desc(plateCalibrations.edition))
    .limit(1)
  return row ?? null
}
export type CalibrationRow = NonNullable<Awaited<ReturnType<typeof findPlateCalibration>>>

interface NewEdition {
  clubId: string
  edition: number
  changedBy: string
}

/** False where somebody else made this edition first. */
export async function insertMeasuringSettings(
  tx: Tx,
  row: NewEdition & { changed: ChangedSettings },
): Promise<boolean> {
  const made = await tx
    .insert(measuringSettings)
    .values(row)
    .onConflictDoNothing()
    .returning({ edition: measuringSettings.edition })
  return made.length > 0
}

/** False where somebody else made this edition first. */
export async function insertPlateCalibration(
  tx: Tx,
  row: NewEdition & Omit<CalibrationRow, 'edition' | 'at' | 'byName'>,
): Promise<boolean> {
  const made = await tx
    .insert(plateCalibrations)
    .values(row)
    .onConflictDoNothing()
    .returning({ edition: plateCalibrations.edition })
  return made.length > 0
}
