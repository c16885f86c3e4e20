import type { Caller } from '../../http/caller.ts'

/** Whoever runs the session: any coach, or the physio who made it. A coach's figures are not a physio's to change. */
export function mayMoveEvents(ctx: Caller, { sessionBy }: { sessionBy: string }): boolean {
  return ctx.roles.includes('coach') || (ctx.roles.includes('physio') && ctx.personId === sessionBy)
}
