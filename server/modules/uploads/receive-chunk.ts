import type { Request, Response } from 'express'
import multer from 'multer'
import { limits } from '../../../shared/contracts/limits.ts'
import { chunkInvalid } from './uploads.errors.ts'

/** Limits hold while the body is read, so that no request can fill the memory. */
const takeOnePart = multer({
  storage: multer.memoryStorage(),
  limits: { files: 1, fields: 0, parts: 1, fileSize: limits.chunkBytes, headerPairs: 20 },
}).single('chunk')

/** The bytes of a form with exactly one part, named `chunk`. */
export async function receiveChunk(req: Request, res: Response): Promise<Buffer> {
  if (!req.is('multipart/form-data'))
    throw chunkInvalid('A part of a file is sent as a form with one part named “chunk”.')
  await new Promise<void>((resolve, reject) => {
    takeOnePart(req, res, (error: unknown) => (error ? reject(asNamed(error)) : resolve()))
  })
  if (!req.file) throw chunkInvalid('The form held no part named “chunk”.')
  return req.file.buffer
}

/** Whatever multer, or the parser below it, makes of a form is the sender's doing. */
function asNamed(error: unknown): Error {
  const code = error instanceof multer.MulterError ? error.code : null
  if (code === 'LIMIT_FILE_SIZE')
    return chunkInvalid(`A part of a file may have at most ${limits.chunkBytes / 2 ** 20} MiB.`, 413)
  if (code) return chunkInvalid('The form must hold exactly one part, named “chunk”.')
  return chunkInvalid('The form could not be read to its end. Send the part again.')
}
