import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import type { changeUpload, Upload } from '../../../shared/contracts/uploads.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { beingRead, hasTrials, stillArriving } from './uploads.errors.ts'
import { setDismissed } from './uploads.queries.ts'
import { requireUpload, view } from './uploads.service.ts'

/**
 * Clears from the Tray a file that will not become a trial: refused, here already, without a trial, or stopped
 * half-way (while it still arrives, by its sender alone). Nothing of it is deleted, and it can be taken back.
 */
export async function setDismissal(
  deps: Deps,
  ctx: Caller,
  uploadId: string,
  { version, dismissed }: BodyOf<typeof changeUpload>,
): Promise<Upload> {
  return deps.db.inClub(ctx, async (tx) => {
    const { uploadedBy } = await requireUpload(tx, ctx, uploadId)
    const upload = await view(tx, ctx, uploadId)
    if (dismissed) requireDismissible(upload, uploadedBy === ctx.personId)
    const by = dismissed ? { personId: ctx.personId, at: deps.clock() } : null
    const set = await setDismissed(tx, { clubId: ctx.clubId, uploadId, version, state: upload.state }, by)
    const now = await view(tx, ctx, uploadId)
    if (!set) throw staleVersion(now)
    await record(tx, ctx, dismissed ? 'upload.dismiss' : 'upload.take-back', 'upload', uploadId)
    await notify(tx, ctx.clubId, { kind: 'session', id: upload.sessionId })
    return now
  })
}

function requireDismissible({ state, trials, arriving, uploadedByName }: Upload, isSender: boolean): void {
  if (state === 'waiting') throw beingRead()
  if (trials > 0) throw hasTrials()
  if (arriving && !isSender) throw stillArriving(uploadedByName)
}
