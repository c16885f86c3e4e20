import type { ClubContext, Tx } from '../../db/database.ts'
import { auditLog } from '../../db/schema/records.ts'

/** Notes who did what to which row, in the transaction that did it: ids only, names come by join. */
export async function record(
  tx: Tx,
  ctx: Pick<ClubContext, 'clubId' | 'personId'>,
  action: string,
  subjectKind: string,
  subjectId: string,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await tx
    .insert(auditLog)
    .values({ clubId: ctx.clubId, personId: ctx.personId, action, subjectKind, subjectId, detail })
}
