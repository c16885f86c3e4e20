import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import {
  changeUpload,
  finishUpload,
  getOriginal,
  sendChunk,
  startUpload,
} from '../../../shared/contracts/uploads.ts'
import { handled, implement, type Route } from '../../http/implement.ts'
import { setDismissal } from './dismissal.service.ts'
import { receiveChunk } from './receive-chunk.ts'
import * as uploads from './uploads.service.ts'

/** Whoever took away the other end of an answer did not wait for the rest of it: no fault of ours. */
function unlessLeft(error: NodeJS.ErrnoException): void {
  if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error
}

export const uploadRoutes: Route[] = [
  implement(startUpload, ({ deps, ctx, params, body }) =>
    uploads.startUpload(deps, ctx, params.sessionId, body),
  ),
  implement(sendChunk, async ({ deps, ctx, params, req, res }) => {
    const bytes = await receiveChunk(req, res)
    await uploads.storeChunk(deps, ctx, { ...params, bytes })
    return { n: params.n }
  }),
  implement(finishUpload, ({ deps, ctx, params }) => uploads.finishUpload(deps, ctx, params.uploadId)),
  implement(changeUpload, ({ deps, ctx, params, body }) => setDismissal(deps, ctx, params.uploadId, body)),
  implement(getOriginal, async ({ deps, ctx, params, res }) => {
    const { fileName, sizeBytes, chunks } = await uploads.openOriginal(deps, ctx, params.uploadId)
    // `attachment` escapes the name; the type says nothing that a browser would open.
    res.attachment(fileName)
    res.type('application/octet-stream')
    res.set({
      'Content-Length': String(sizeBytes),
      'X-Content-Type-Options': 'nosniff',
      'Cache-Control': 'no-store, no-transform',
    })
    await pipeline(Readable.from(chunks), res).catch(unlessLeft)
    return handled
  }),
]
