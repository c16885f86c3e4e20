import { sql, type ExtractTablesWithRelations } from 'drizzle-orm'
import { drizzle, type NodePgQueryResultHKT } from 'drizzle-orm/node-postgres'
import type { PgTransaction } from 'drizzle-orm/pg-core'
import pg from 'pg'
import type { Role } from '../../shared/contracts/roles.ts'
import { staffRoles } from '../../shared/contracts/roles.ts'

/** What row-level security asks of a transaction besides the club. Staff: coach, physio, admin, or the worker. */
export type Capability = 'staff' | 'physio' | 'admin'

/** For whom a transaction on club data runs. `personId` is null for the worker. */
export interface ClubContext {
  clubId: string
  personId: string | null
  capabilities: readonly Capability[]
}

type NoSchema = Record<string, never>
/** A running transaction. */
export type Tx = PgTransaction<NodePgQueryResultHKT, NoSchema, ExtractTablesWithRelations<NoSchema>>

export interface Database {
  /** For packages that bring statements of their own on tables outside the club policies (sign-ins, rate limits). */
  pool: pg.Pool
  /** A short transaction on one club's rows. Database statements only: no hash, no network call, no stream inside. */
  inClub<T>(ctx: ClubContext, work: (tx: Tx) => Promise<T>): Promise<T>
  /** The same for reading: all its statements see the club as it was at one moment. */
  atOneMoment<T>(ctx: ClubContext, work: (tx: Tx) => Promise<T>): Promise<T>
  /** A short transaction on people, clubs, invitations and mail, that sees no club data. */
  inIdentity<T>(work: (tx: Tx) => Promise<T>): Promise<T>
  close(): Promise<void>
}

export interface DatabaseOptions {
  databaseUrl: string
  poolSize: number
  statementTimeoutMs: number
}

/** Opens the pool; `onIdleError` hears of connections that broke while nobody used them. */
export function createDatabase(options: DatabaseOptions, onIdleError: (error: Error) => void): Database {
  const pool = new pg.Pool({
    connectionString: options.databaseUrl,
    max: options.poolSize,
    statement_timeout: options.statementTimeoutMs,
    idle_in_transaction_session_timeout: options.statementTimeoutMs,
    connectionTimeoutMillis: 10_000,
    application_name: 'underfoot',
    options: '-c timezone=UTC',
  })
  pool.on('error', onIdleError)
  const database = drizzle(pool)
  const asClub =
    <T>(ctx: ClubContext, work: (tx: Tx) => Promise<T>) =>
    async (tx: Tx) => {
      await setClub(tx, ctx)
      return work(tx)
    }
  return {
    pool,
    inClub: (ctx, work) => database.transaction(asClub(ctx, work)),
    atOneMoment: (ctx, work) =>
      database.transaction(asClub(ctx, work), { isolationLevel: 'repeatable read', accessMode: 'read only' }),
    inIdentity: (work) =>
      database.transaction(async (tx) => {
        await tx.execute(sql`set local role underfoot_identity`)
        return work(tx)
      }),
    close: () => pool.end(),
  }
}

/**
 * Goes on from identity to one club within the same transaction, for the few acts that change both at once
 * (an accepted invitation makes the membership and links the athlete).
 */
export async function enterClub(tx: Tx, ctx: ClubContext): Promise<void> {
  await tx.execute(sql`set local role none`)
  await setClub(tx, ctx)
}

async function setClub(tx: Tx, ctx: ClubContext): Promise<void> {
  await tx.execute(sql`select
    set_config('app.club_id', ${ctx.clubId}, true),
    set_config('app.person_id', ${ctx.personId ?? ''}, true),
    set_config('app.capabilities', ${ctx.capabilities.join(',')}, true)`)
}

/** What a person's roles in the club allow in its rows. */
export function capabilitiesOf(roles: readonly Role[]): Capability[] {
  const capabilities: Capability[] = []
  if (roles.some((role) => (staffRoles as readonly Role[]).includes(role))) capabilities.push('staff')
  if (roles.includes('physio')) capabilities.push('physio')
  if (roles.includes('admin')) capabilities.push('admin')
  return capabilities
}

/** The context of a job that works for a club, for no person in particular. */
export const workerContext = (clubId: string): ClubContext => ({
  clubId,
  personId: null,
  capabilities: ['staff'],
})
