import { describe, expect, it, vi } from 'vitest'
import { limits } from '../../../shared/contracts/limits.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { ApiError } from '../../api/api-error.ts'
import type { Transport } from './send-file.ts'
import { createUploadQueue, type UploadQueue } from './upload-queue.ts'

const MIB = limits.chunkBytes

function file(name: string, size: number): File {
  const made = new File([], name)
  Object.defineProperty(made, 'size', { value: size })
  return made
}

function upload(id: string, given: Partial<Upload> = {}): Upload {
  return {
    id,
    sessionId: 's',
    fileName: 'a.csv',
    sizeBytes: 100,
    state: 'receiving',
    error: null,
    notes: [],
    duplicateOf: null,
    archive: null,
    chunksReceived: [],
    lastReceivedAt: '2026-11-12T10:00:00.000Z',
    arriving: true,
    dismissed: null,
    trials: 0,
    uploadedByName: 'Invented Coach',
    createdAt: '2026-11-12T10:00:00.000Z',
    version: 1,
    ...given,
  }
}

/** A server that takes everything, and what it was asked. */
function takingTransport() {
  let keys = 0
  let uploads = 0
  const transport = {
    start: vi.fn<Transport['start']>(async () => upload(`u${++uploads}`)),
    send: vi.fn<Transport['send']>(async () => {}),
    finish: vi.fn<Transport['finish']>(async (id) => upload(id, { state: 'waiting' })),
    dismiss: vi.fn<Transport['dismiss']>(async (id) => upload(id)),
    newKey: () => `key-${++keys}`,
    wait: vi.fn(async () => {}),
  }
  return transport
}

const settled = (queue: UploadQueue) =>
  vi.waitFor(() => expect(queue.files().every((f) => !['queued', 'sending'].includes(f.stage))).toBe(true))
const stages = (queue: UploadQueue) => queue.files().map((f) => f.stage)

describe('createUploadQueue(transport)', () => {
  it('sends each file in pieces of 1 MiB and finishes it', async () => {
    const transport = takingTransport()
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 2.5 * MIB)])
    await settled(queue)
    expect(transport.send.mock.calls.map(([id, n]) => [id, n])).toEqual([
      ['u1', 0],
      ['u1', 1],
      ['u1', 2],
    ])
    expect(transport.finish).toHaveBeenCalledOnce()
    expect(queue.files()[0]).toMatchObject({ stage: 'sent', sentBytes: 2.5 * MIB, uploadId: 'u1' })
  })

  it('announces and finishes an empty file, so that the server can say what is wrong with it', async () => {
    const transport = takingTransport()
    const queue = createUploadQueue(transport)
    queue.add([file('empty.csv', 0)])
    await settled(queue)
    expect(transport.send).not.toHaveBeenCalled()
    expect(transport.finish).toHaveBeenCalledOnce()
  })

  it('refuses a file over 64 MiB with the reader’s own sentence, sends nothing of it, and sends the others', async () => {
    const transport = takingTransport()
    const queue = createUploadQueue(transport)
    queue.add([file('big.csv', 65 * MIB), file('a.csv', 100)])
    await settled(queue)
    expect(stages(queue)).toEqual(['refused', 'sent'])
    expect(queue.files()[0]!.refusal?.sentence).toBe(
      'The file has 65 MiB, and 64 MiB is the most that is read.',
    )
    expect(transport.start).toHaveBeenCalledOnce()
  })

  it('has at most four requests under way', async () => {
    const transport = takingTransport()
    let under = 0
    let most = 0
    const counted = async () => {
      most = Math.max(most, ++under)
      await Promise.resolve()
      under--
    }
    transport.send.mockImplementation(counted)
    transport.start.mockImplementation(async ({ fileName }) => {
      await counted()
      return upload(fileName)
    })
    const queue = createUploadQueue(transport)
    queue.add(Array.from({ length: 12 }, (_, i) => file(`${i}.csv`, 3 * MIB)))
    await settled(queue)
    expect(transport.send).toHaveBeenCalledTimes(36)
    expect(most).toBe(4)
  })

  it('announces the files in the order of the drop', async () => {
    const transport = takingTransport()
    const ends: (() => void)[] = []
    transport.start.mockImplementation(
      ({ fileName }) => new Promise((resolve) => ends.push(() => resolve(upload(fileName)))),
    )
    const queue = createUploadQueue(transport)
    queue.add(['1.csv', '2.csv', '3.csv'].map((name) => file(name, 10)))
    for (let n = 0; n < 3; n++) {
      await vi.waitFor(() => expect(ends).toHaveLength(n + 1))
      ends[n]!()
    }
    await settled(queue)
    expect(transport.start.mock.calls.map(([{ fileName }]) => fileName)).toEqual(['1.csv', '2.csv', '3.csv'])
  })

  it('keeps one file’s failure to itself', async () => {
    const transport = takingTransport()
    transport.start.mockRejectedValueOnce(new ApiError('file-name-invalid', 'No name.'))
    const queue = createUploadQueue(transport)
    queue.add([file('/', 10), file('a.csv', 10)])
    await settled(queue)
    expect(stages(queue)).toEqual(['failed', 'sent'])
    expect(queue.files()[0]!.error).toBeInstanceOf(ApiError)
  })

  it('waits and sends a piece again when the network gave no answer', async () => {
    const transport = takingTransport()
    transport.send.mockRejectedValueOnce(new ApiError('no-answer', ''))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 10)])
    await settled(queue)
    expect(transport.wait).toHaveBeenCalledOnce()
    expect(stages(queue)).toEqual(['sent'])
  })

  it('takes a failed file up where it stopped, without announcing it again', async () => {
    const transport = takingTransport()
    transport.send.mockImplementation(async (_id, n) => {
      if (n === 1) throw new ApiError('internal', 'Broken.')
    })
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 2 * MIB)])
    await settled(queue)
    expect(stages(queue)).toEqual(['failed'])
    transport.send.mockClear()
    transport.send.mockImplementation(async () => {})
    queue.retry(queue.files()[0]!.key)
    await settled(queue)
    expect(transport.start).toHaveBeenCalledOnce()
    expect(transport.send.mock.calls.map(([, n]) => n)).toEqual([1])
    expect(stages(queue)).toEqual(['sent'])
  })

  it('announces a file with the same key when it is tried again, so that it is there once', async () => {
    const transport = takingTransport()
    transport.start.mockRejectedValueOnce(new ApiError('internal', 'Broken.'))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 10)])
    await settled(queue)
    queue.retry(queue.files()[0]!.key)
    await settled(queue)
    const [first, second] = transport.start.mock.calls.map(([start]) => start.idempotencyKey)
    expect(second).toBe(first)
  })

  it('takes up an upload that another page load began, sending what is missing and the last piece as proof', async () => {
    const transport = takingTransport()
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 4 * MIB)], [upload('earlier', { sizeBytes: 4 * MIB, chunksReceived: [0, 1] })])
    await settled(queue)
    expect(transport.start).not.toHaveBeenCalled()
    expect(transport.send.mock.calls.map(([id, n]) => [id, n])).toEqual([
      ['earlier', 1],
      ['earlier', 2],
      ['earlier', 3],
    ])
  })

  it('announces the file afresh when what is there turns out to be another one', async () => {
    const transport = takingTransport()
    transport.send.mockRejectedValueOnce(new ApiError('chunk-invalid', 'Other bytes.'))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 100)], [upload('earlier', { chunksReceived: [0] })])
    await settled(queue)
    expect(transport.start).toHaveBeenCalledOnce()
    expect(queue.files()[0]).toMatchObject({ stage: 'sent', uploadId: 'u1' })
  })

  it('cancels a file that is not announced yet without a word to the server', async () => {
    const transport = takingTransport()
    let release = () => {}
    transport.start.mockImplementation(() => new Promise((resolve) => (release = () => resolve(upload('u')))))
    const queue = createUploadQueue(transport)
    queue.add(Array.from({ length: 5 }, (_, i) => file(`${i}.csv`, 10)))
    await vi.waitFor(() =>
      expect(stages(queue)).toEqual(['sending', 'sending', 'sending', 'sending', 'queued']),
    )
    queue.remove(queue.files()[4]!.key)
    expect(queue.files().map((f) => f.fileName)).toEqual(['0.csv', '1.csv', '2.csv', '3.csv'])
    expect(transport.dismiss).not.toHaveBeenCalled()
    release()
  })

  it('cancels a file that goes up: no further piece is sent, and the upload is dismissed', async () => {
    const transport = takingTransport()
    const sending: (() => void)[] = []
    transport.send.mockImplementation(() => new Promise((resolve) => sending.push(resolve)))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 6 * MIB)])
    await vi.waitFor(() => expect(sending).toHaveLength(4))
    queue.remove(queue.files()[0]!.key)
    expect(queue.files()).toEqual([])
    for (const end of sending) end()
    await vi.waitFor(() => expect(transport.dismiss).toHaveBeenCalledOnce())
    expect(transport.dismiss.mock.calls[0]!.slice(0, 2)).toEqual(['u1', 1])
    expect(transport.send).toHaveBeenCalledTimes(4)
    expect(transport.finish).not.toHaveBeenCalled()
  })

  it('dismisses a file that was cancelled during its announcement as soon as that is answered', async () => {
    const transport = takingTransport()
    let release = () => {}
    transport.start.mockImplementation(() => new Promise((resolve) => (release = () => resolve(upload('u')))))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 10)])
    await vi.waitFor(() => expect(transport.start).toHaveBeenCalledOnce())
    queue.remove(queue.files()[0]!.key)
    release()
    await vi.waitFor(() => expect(transport.dismiss).toHaveBeenCalledOnce())
    expect(transport.send).not.toHaveBeenCalled()
  })

  it('announces a file anew when it is tried again after somebody dismissed it', async () => {
    const transport = takingTransport()
    transport.send.mockRejectedValueOnce(new ApiError('upload-dismissed', 'Dismissed.'))
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 10)])
    await settled(queue)
    expect(stages(queue)).toEqual(['failed'])
    queue.retry(queue.files()[0]!.key)
    await settled(queue)
    expect(queue.files()[0]).toMatchObject({ stage: 'sent', uploadId: 'u2' })
  })

  it('does not take up an upload that was dismissed', async () => {
    const transport = takingTransport()
    const dismissed = { at: '2026-11-12T10:05:00.000Z', byName: 'Invented Coach' }
    const queue = createUploadQueue(transport)
    queue.add([file('a.csv', 100)], [upload('earlier', { dismissed })])
    await settled(queue)
    expect(queue.files()[0]).toMatchObject({ stage: 'sent', uploadId: 'u1' })
  })
})
