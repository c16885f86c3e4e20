import { loadConfig } from '../../server/config/config.ts'
import { createDatabase } from '../../server/db/database.ts'
import { buildAthlete, buildSquad } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { makeJump } from '../../seed/synthetic/jump.ts'
import type { JumpOptions } from '../../seed/synthetic/options.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'
import type { Product } from '../setup/product.ts'

/** Invented athletes of an invented squad. */
export const athleteNames = [
  'Mara Ostrow',
  'Tomas Brandvold',
  'Lena Vogt',
  'Idris Fenwick',
  'Pia Marchetti',
  'Osei Kwarteng',
  'Ruth Hallam',
  'Dario Lindqvist',
  'Nell Ashdown',
  'Kofi Adeyemi',
  'Jório Ñandez',
  'Selma Grøndal',
] as const

export const people = {
  coach: { email: 'coach@saltmarsh.example', name: 'Ines Calloway' },
  physio: { email: 'physio@saltmarsh.example', name: 'Bram Oyelaran' },
  admin: { email: 'admin@saltmarsh.example', name: 'Greta Halloran' },
  athlete: { email: 'mara@saltmarsh.example', name: 'Mara Ostrow' },
} as const

export const squadName = 'Senior squad'

/** A club with one of each role and a squad; the first athlete signs in as themselves. */
export async function buildClubDay(product: Product): Promise<void> {
  const config = loadConfig('web', { ...product.env })
  const db = createDatabase(config, () => undefined)
  try {
    const clubId = await buildClub(db, {
      name: 'Saltmarsh Athletic Club',
      timeZone: 'Europe/London',
      seats: 20,
    })
    const squadId = await buildSquad(db, clubId, { name: squadName })
    for (const role of ['coach', 'physio', 'admin'] as const)
      await buildMember(db, clubId, [role], people[role])
    const { id: personId } = await buildMember(db, clubId, ['athlete'], people.athlete)
    for (const name of athleteNames) {
      await buildAthlete(db, clubId, {
        name,
        squadIds: [squadId],
        personId: name === people.athlete.name ? personId : null,
      })
    }
  } finally {
    await db.close()
  }
}

export interface TestFile {
  name: string
  mimeType: string
  buffer: Buffer
}

/** The file of a countermovement jump, made from physics; each seed is another file. */
export function jumpFile(name: string, seed: number, jump: Partial<JumpOptions> = {}): TestFile {
  const plates = {
    left: { whiteNoiseN: 1.2, offsetN: 3 },
    right: { whiteNoiseN: 1.2, offsetN: -2 },
  }
  const varied: Partial<JumpOptions> = {
    massKg: 60 + ((seed * 7) % 30),
    takeoffVelocity: 2.3 + ((Math.floor(seed / 3) * 13) % 10) / 20 + (seed % 3) * 0.02,
    landing: seed % 2 === 0 ? 'onePeak' : 'twoPeaks',
    shares: { stance: 0.52, unweighting: 0.51, braking: 0.48, propulsion: 0.49, landing: 0.53 },
    body: { swayVelocity: 0.002, heartbeatN: 2, heartRateHz: 1.1, fidgetN: 0 },
    ...jump,
  }
  return csv(name, Buffer.from(writeDelimited(recordJump(makeJump(varied, seed), {}, plates, seed))))
}

export const csv = (name: string, content: Buffer | string): TestFile => ({
  name,
  mimeType: 'text/csv',
  buffer: Buffer.from(content),
})

/** Forty recordings: three jumps an athlete, three of the last one's, and one whose name names nobody. */
export function fortyFiles(): TestFile[] {
  const named = athleteNames.flatMap((name, a) =>
    [1, 2, 3].map((n) => jumpFile(`${name} jump ${n}.csv`, 3 * a + n, { massKg: 58 + 3 * a })),
  )
  const more = [1, 2, 3].map((n) => jumpFile(`Mara-Ostrow_extra_${n}.csv`, 100 + n, { massKg: 58 }))
  return [...named, ...more, jumpFile('plate_0931.csv', 200, { massKg: 64 })]
}
