import { describe, expect, it } from 'vitest'
import { ApiError } from '../../api/api-error.ts'
import { anUpload } from '../../../tests/setup/msw/measured.ts'
import { fileProgress, isOnItsWay, readCount } from './file-progress.ts'
import type { QueuedFile } from './upload-queue.ts'

const file = (change: Partial<QueuedFile> = {}): QueuedFile => ({
  key: 'k',
  fileName: 'a.csv',
  sizeBytes: 100,
  stage: 'queued',
  sentBytes: 0,
  uploadId: null,
  refusal: null,
  error: null,
  ...change,
})

describe('fileProgress(file, upload)', () => {
  it('may be cancelled before it goes up and while it does', () => {
    expect(fileProgress(file(), undefined)).toMatchObject({ words: 'in line', canRemove: true, sent: null })
    const sending = file({ stage: 'sending', sentBytes: 40, uploadId: 'u' })
    expect(fileProgress(sending, undefined)).toMatchObject({ words: 'going up', canRemove: true, sent: 0.4 })
  })

  it('shows an empty file as wholly sent, and divides by nothing', () => {
    expect(fileProgress(file({ stage: 'sending', sizeBytes: 0 }), undefined).sent).toBe(1)
  })

  it('says what stopped a file and may be tried again', () => {
    const error = new ApiError('no-answer', 'The server could not be reached.')
    const stopped = fileProgress(file({ stage: 'failed', error, uploadId: 'u' }), undefined)
    expect(stopped).toMatchObject({ words: 'stopped', canRetry: true, canRemove: true })
    expect(stopped.problem?.sentence).toBe('The server could not be reached.')
  })

  it('is done once the server has read or refused it, and not before', () => {
    const sent = file({ stage: 'sent', uploadId: 'u' })
    expect(fileProgress(sent, undefined)).toMatchObject({ words: 'sent, being read', done: false })
    expect(fileProgress(sent, anUpload(1, { state: 'waiting' })).done).toBe(false)
    expect(fileProgress(sent, anUpload(1, { state: 'read', trials: 2 }))).toMatchObject({
      words: 'read, 2 trials',
      done: true,
    })
    expect(fileProgress(sent, anUpload(1, { state: 'duplicate' }))).toMatchObject({
      words: 'here already',
      done: true,
    })
  })
})

describe('readCount(uploads, files)', () => {
  it('counts each file once, whether this page or the server knows it, and none that was refused here', () => {
    const uploads = [anUpload(1), anUpload(2, { state: 'refused' }), anUpload(3, { state: 'waiting' })]
    const files = [
      file({ stage: 'sent', uploadId: uploads[0]!.id }),
      file({ stage: 'sending', uploadId: 'not on the sheet yet' }),
      file(),
      file({ stage: 'refused' }),
    ]
    expect(readCount(uploads, files)).toEqual({ read: 2, of: 5 })
  })

  it('leaves out what was dismissed half-way, and counts what was dismissed after it was read', () => {
    const dismissed = { at: '2026-11-12T11:00:00.000Z', byName: 'Ines Calloway' }
    const uploads = [
      anUpload(1, { state: 'receiving', dismissed }),
      anUpload(2, { state: 'refused', dismissed }),
    ]
    expect(readCount(uploads, [])).toEqual({ read: 1, of: 1 })
  })

  it('counts nothing for nothing', () => {
    expect(readCount([], [])).toEqual({ read: 0, of: 0 })
  })
})

describe('isOnItsWay(upload, files)', () => {
  const receiving = anUpload(1, { state: 'receiving', fileName: 'a.csv', sizeBytes: 100 })

  it('knows an upload that the server speaks of before it has answered the announcement', () => {
    expect(isOnItsWay(receiving, [file({ stage: 'sending' })])).toBe(true)
    expect(isOnItsWay(receiving, [file({ stage: 'sending', fileName: 'b.csv' })])).toBe(false)
  })

  it('leaves what another page load began, and what has been sent, to the Tray', () => {
    expect(isOnItsWay(receiving, [])).toBe(false)
    expect(isOnItsWay(receiving, [file({ stage: 'sent', uploadId: receiving.id })])).toBe(false)
    expect(isOnItsWay(receiving, [file({ stage: 'sending', uploadId: 'another' })])).toBe(false)
  })
})
