import { readFileSync } from 'node:fs'
import { Router } from 'express'
import { z } from 'zod'
import type { Deps } from '../deps.ts'

const Journal = z.object({ entries: z.array(z.object({ when: z.number() })) })

/** The time stamp by which Drizzle knows the newest migration of this code. */
function newestMigration(): number {
  const { entries } = Journal.parse(JSON.parse(readFileSync('drizzle/meta/_journal.json', 'utf8')))
  return Math.max(...entries.map(({ when }) => when))
}

/** `/healthz`: the process answers. `/readyz`: the database answers too, and is as new as this code. */
export function healthRoutes({ db, log }: Pick<Deps, 'db' | 'log'>): Router {
  const router = Router()
  const needed = newestMigration()
  router.get('/healthz', (_req, res) => void res.json({ ok: true }))
  router.get('/readyz', async (_req, res) => {
    const problem = await databaseProblem(db, needed).catch((error: unknown) => {
      log.warn({ err: error }, 'not ready')
      return 'The database cannot be reached.'
    })
    if (problem) res.status(503).json({ ok: false, problem })
    else res.json({ ok: true })
  })
  return router
}

async function databaseProblem(db: Deps['db'], needed: number): Promise<string | null> {
  const { rows } = await db.pool.query<{ newest: string | null }>(
    'select max(created_at) as newest from drizzle.__drizzle_migrations',
  )
  return Number(rows[0]?.newest ?? 0) >= needed ? null : 'The database has not been migrated.'
}
