import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { Response } from 'express'
import { getSessionArchive, getTrialCsv } from '../../../shared/contracts/downloads.ts'
import { handled, implement, type Route } from '../../http/implement.ts'
import { sessionArchive, trialCsv } from './downloads.service.ts'

/** Sends a stream as an attachment that no browser opens or keeps; `attachment` escapes the name. */
async function send(
  res: Response,
  fileName: string,
  type: string,
  content: Readable,
): Promise<typeof handled> {
  res.attachment(fileName)
  res.type(type)
  res.set({ 'X-Content-Type-Options': 'nosniff', 'Cache-Control': 'no-store, no-transform' })
  await pipeline(content, res).catch(unlessLeft)
  return handled
}

/** Whoever leaves a download early is no fault of ours. */
function unlessLeft(error: unknown): void {
  if (!(error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE')) throw error
}

export const downloadRoutes: Route[] = [
  implement(getTrialCsv, async ({ deps, ctx, params, res }) => {
    const { fileName, lines } = await trialCsv(deps, ctx, params.trialId)
    return send(res, fileName, 'text/csv; charset=utf-8', Readable.from(lines, { objectMode: false }))
  }),
  implement(getSessionArchive, async ({ deps, ctx, params, res }) => {
    const { fileName, archive } = await sessionArchive(deps, ctx, params.sessionId)
    return send(res, fileName, 'application/zip', archive)
  }),
]
