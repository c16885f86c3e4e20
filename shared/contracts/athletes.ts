import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { BodyMassKg, Id, IsoDate, Name, Version } from './fields.ts'
import { ResultPoint } from './results.ts'
import { staffRoles } from './roles.ts'

export const Athlete = z.strictObject({
  id: Id,
  name: z.string(),
  bornOn: IsoDate.nullable(),
  recordedMassKg: z.number().nullable(),
  squadIds: z.array(Id),
  /** Whether a person signs in as this athlete. */
  linked: z.boolean(),
  archived: z.boolean(),
  version: Version,
})
export type Athlete = z.infer<typeof Athlete>

export const AthleteForm = z.strictObject({
  name: Name,
  bornOn: IsoDate.nullable(),
  recordedMassKg: BodyMassKg.nullable(),
  squadIds: z.array(Id),
})

export const listAthletes = endpoint({
  method: 'GET',
  path: '/api/athletes',
  access: staffRoles,
  response: z.strictObject({ athletes: z.array(Athlete) }),
})
export const createAthlete = endpoint({
  method: 'POST',
  path: '/api/athletes',
  access: ['coach', 'admin'],
  body: AthleteForm,
  response: Athlete,
})
export const changeAthlete = endpoint({
  method: 'PATCH',
  path: '/api/athletes/:athleteId',
  access: ['coach', 'admin'],
  params: z.strictObject({ athleteId: Id }),
  body: AthleteForm.partial().extend({ version: Version, archived: z.boolean().optional() }),
  response: Athlete,
})
/** The athlete with one point a session, oldest first, of the sheets as they stand. */
export const getAthlete = endpoint({
  method: 'GET',
  path: '/api/athletes/:athleteId',
  access: ['coach', 'physio'],
  params: z.strictObject({ athleteId: Id }),
  response: z.strictObject({ athlete: Athlete, results: z.array(ResultPoint) }),
})
