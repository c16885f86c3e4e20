import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id } from './fields.ts'
import { measuringRoles } from './roles.ts'

/** The trial's cleaned samples as CSV, an attachment: seconds, and newtons to 0.001 N as they are analysed. */
export const getTrialCsv = endpoint({
  method: 'GET',
  path: '/api/trials/:trialId/samples.csv',
  access: measuringRoles,
  params: z.strictObject({ trialId: Id }),
  response: z.unknown(),
})

/** The session as a zip archive, an attachment: originals, cleaned samples of every trial, and all figures. */
export const getSessionArchive = endpoint({
  method: 'GET',
  path: '/api/sessions/:sessionId/archive.zip',
  access: measuringRoles,
  params: z.strictObject({ sessionId: Id }),
  response: z.unknown(),
})
