import { limits } from '../../../shared/contracts/limits.ts'
import { tooLargeError } from '../../../shared/recordings/errors.ts'
import type { ReadError } from '../../db/schema/uploads.ts'
import { namedError } from '../../http/errors.ts'
import type { ThreadEnded } from '../../jobs/threads/threads.ts'

export const fileTooLarge = (sizeBytes: number) => {
  const { sentence, remedy } = tooLargeError(sizeBytes)
  return namedError('file-too-large', 413, `${sentence} ${remedy}`)
}

export const fileNameInvalid = (fileName: string) =>
  namedError(
    'file-name-invalid',
    400,
    `“${fileName.slice(0, 40)}” holds no file name. Give the file a name and upload it again.`,
  )

export const chunkInvalid = (sentence: string, status = 400) => namedError('chunk-invalid', status, sentence)

export const uploadFinished = () =>
  namedError('upload-finished', 409, 'This file was finished already; nothing can be added to it.')

export const uploadDismissed = () =>
  namedError(
    'upload-dismissed',
    409,
    'This file was dismissed before all of it was here. What had arrived is kept.',
  )

export const tooManyUploads = () =>
  namedError(
    'too-many-uploads',
    409,
    `At most ${limits.unfinishedUploads} of your files, or ${limits.unfinishedBytes / 1024 ** 3} GiB of them, may be on their way at once.`,
  )

const inUse = (sentence: string) => namedError('upload-in-use', 409, sentence)
export const stillArriving = (senderName: string) => inUse(`${senderName} is sending this file now.`)
export const beingRead = () => inUse('This file is being read this moment.')
export const hasTrials = () => inUse('Trials of this file stand on the sheet. Set those aside instead.')

export const uploadIncomplete = (missing: number[]) =>
  namedError(
    'upload-incomplete',
    409,
    'Parts of this file have not arrived yet. Send them and finish it then.',
    {
      missing,
    },
  )

const tryElse = 'Export the recording again, or one jump a file, and upload that. The file itself is kept.'

/** The thread that read the file was ended: by its time limit, or by its memory limit. */
export const readingEnded = (ended: ThreadEnded): ReadError =>
  ended.reason === 'time'
    ? {
        code: 'reading-too-long',
        sentence: 'The file took too long to read, and reading was stopped.',
        remedy: tryElse,
      }
    : {
        code: 'reading-too-much-memory',
        sentence: 'The file needed more memory to read than there is.',
        remedy: tryElse,
      }

/** Every try to read the file ended badly, without saying why. */
export const readingFailed = (): ReadError => ({
  code: 'reading-failed',
  sentence: 'The file could not be read after several tries; the fault is on our side.',
  remedy: 'Upload it again later. The file itself is kept.',
})
