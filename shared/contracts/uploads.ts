import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, Moment, Version } from './fields.ts'
import { limits } from './limits.ts'
import { measuringRoles } from './roles.ts'

/** `unpacked`: an archive whose files are uploads of their own. */
export const UploadState = z.enum(['receiving', 'waiting', 'read', 'unpacked', 'refused', 'duplicate'])

export const Upload = z.strictObject({
  id: Id,
  sessionId: Id,
  fileName: z.string(),
  sizeBytes: z.number().int(),
  state: UploadState,
  /** What was found in a file that could not be read, and what to do. */
  error: z
    .strictObject({
      code: z.string(),
      sentence: z.string(),
      remedy: z.string(),
      line: z.number().int().optional(),
      column: z.number().int().optional(),
      seen: z.string().optional(),
    })
    .nullable(),
  notes: z.array(z.strictObject({ code: z.string(), sentence: z.string() })),
  duplicateOf: z.strictObject({ uploadId: Id, sessionId: Id, fileName: z.string() }).nullable(),
  /** The archive that it came in. */
  archive: z.strictObject({ uploadId: Id, fileName: z.string() }).nullable(),
  /** Chunks that have arrived, for taking up an upload again. */
  chunksReceived: z.array(z.number().int()),
  /** When the newest chunk came, or before any the announcement. */
  lastReceivedAt: Moment,
  /** True where chunks are still to come and one came within `limits.arrivingSeconds`: somebody is sending it. */
  arriving: z.boolean(),
  /** Cleared from the Tray, and by whom; taken back it stands there as before. */
  dismissed: z.strictObject({ at: Moment, byName: z.string() }).nullable(),
  trials: z.number().int(),
  uploadedByName: z.string(),
  createdAt: Moment,
  version: Version,
})
export type Upload = z.infer<typeof Upload>

/** Announces a file; its bytes follow in chunks of `limits.chunkBytes`, in any order, each repeatable. */
export const startUpload = endpoint({
  method: 'POST',
  path: '/api/sessions/:sessionId/uploads',
  access: measuringRoles,
  params: z.strictObject({ sessionId: Id }),
  body: z.strictObject({
    fileName: z.string().min(1).max(limits.fileNameCharacters),
    sizeBytes: z.number().int().min(0),
  }),
  response: Upload,
})
const UploadParams = z.strictObject({ uploadId: Id })
/** multipart/form-data with one part named `chunk`. */
export const sendChunk = endpoint({
  method: 'PUT',
  path: '/api/uploads/:uploadId/chunks/:n',
  access: measuringRoles,
  params: UploadParams.extend({
    /** In decimal digits alone: what else JavaScript takes for a number is no address of a part. */
    n: z.coerce
      .string()
      .regex(/^(?:0|[1-9]\d*)$/)
      .transform(Number)
      .pipe(z.number().max(limits.fileBytes / limits.chunkBytes - 1)),
  }),
  body: z.unknown(),
  response: z.strictObject({ n: z.number().int() }),
  repeat: 'natural',
})
/** All chunks are there: the whole is hashed, recognised if the club has it, else queued for reading. */
export const finishUpload = endpoint({
  method: 'POST',
  path: '/api/uploads/:uploadId/finish',
  access: measuringRoles,
  params: UploadParams,
  response: Upload,
})
/** Clears a file from the Tray that will not become a trial, or takes it back; its bytes are kept either way. */
export const changeUpload = endpoint({
  method: 'PATCH',
  path: '/api/uploads/:uploadId',
  access: measuringRoles,
  params: UploadParams,
  body: z.strictObject({ version: Version, dismissed: z.boolean() }),
  response: Upload,
})
/** The original, byte for byte, as an attachment. */
export const getOriginal = endpoint({
  method: 'GET',
  path: '/api/uploads/:uploadId/original',
  access: measuringRoles,
  params: UploadParams,
  response: z.unknown(),
})
