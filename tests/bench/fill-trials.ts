import type { TestDatabase } from '../setup/database.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'

/** Trials of one copied session, as after a usual testing day. */
const trialsInSession = 40

/**
 * Copies the club's analysed trials, with their samples and analyses, into sessions of their own until there are
 * `count` more of them; the copies' analyses are of an engine before this one. In SQL, past the rules that hold for
 * the product: a benchmark's filling and nothing else.
 */
export async function fillTrials(database: TestDatabase, clubId: string, count: number): Promise<void> {
  await onDatabase(database.adminUrl, async (admin) => {
    await admin.query(
      `create temp table copied_sessions as
         select gen_random_uuid() as id, n, (select id from club.sessions where club_id = $1 limit 1) as of
         from generate_series(0, ceil($2::float8 / $3)::int - 1) as n`,
      [clubId, count, trialsInSession],
    )
    await admin.query(
      `create temp table copies as
         with base as (
           select id, upload_id, row_number() over (order by dropped_at, id) - 1 as k, count(*) over () as of
           from club.trials where club_id = $1
         )
         select gen_random_uuid() as id, base.id as base_id, base.upload_id, copied_sessions.id as session_id,
           2 + m / base.of as ordinal
         from generate_series(0, $2::int - 1) as m
         join base on base.k = m % base.of
         join copied_sessions on copied_sessions.n = m / $3`,
      [clubId, count, trialsInSession],
    )
    await copy(admin, 'sessions', clubId, 'copied_sessions c on c.of = t.id', { id: 'c.id' })
    await copy(admin, 'trials', clubId, 'copies c on c.base_id = t.id', {
      id: 'c.id',
      session_id: 'c.session_id',
      ordinal: 'c.ordinal',
    })
    await copy(admin, 'trial_samples', clubId, 'copies c on c.base_id = t.trial_id', { trial_id: 'c.id' })
    await copy(admin, 'analyses', clubId, 'copies c on c.base_id = t.trial_id', {
      id: 'gen_random_uuid()',
      trial_id: 'c.id',
      engine_version: `'before'`,
    })
    await admin.query('vacuum analyze')
  })
}

type Client = Parameters<Parameters<typeof onDatabase>[1]>[0]

/** Copies the club's rows of a table, joined with what says how often, with these columns in place of their own. */
async function copy(
  admin: Client,
  table: string,
  clubId: string,
  join: string,
  replaced: Record<string, string>,
): Promise<void> {
  const { rows } = await admin.query<{ name: string }>(
    `select column_name as name from information_schema.columns where table_schema = 'club' and table_name = $1`,
    [table],
  )
  const names = rows.map(({ name }) => name)
  const values = names.map((name) => replaced[name] ?? `t.${name}`)
  await admin.query(
    `insert into club.${table} (${names.join(', ')})
     select ${values.join(', ')} from club.${table} t join ${join} where t.club_id = $1`,
    [clubId],
  )
}
