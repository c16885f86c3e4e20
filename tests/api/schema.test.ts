import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { createTestDatabase, type TestDatabase } from '../setup/database.ts'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

/** What a query of PostgreSQL's own catalogue finds; each test asks for the offenders, and wants none. */
async function find(query: string): Promise<string[]> {
  return onDatabase(database.adminUrl, async (admin) => {
    const { rows } = await admin.query<{ name: string }>(query)
    return rows.map((row) => row.name)
  })
}

const clubTables = `pg_class t join pg_namespace n on n.oid = t.relnamespace
  where n.nspname = 'club' and t.relkind in ('r', 'p')`

/** The name of the n-th column of a constraint `c`. */
const columnOf = (n: number, side: 'conkey' | 'confkey', table: 'conrelid' | 'confrelid') =>
  `(select attname from pg_attribute where attrelid = c.${table} and attnum = c.${side}[${n}])`

describe('the migrated schema', () => {
  it('has tables of the club at all', async () => {
    expect((await find(`select t.relname as name from ${clubTables}`)).length).toBeGreaterThan(5)
  })

  it('forces row-level security on every table of the club and of identity, with at least one policy', async () => {
    const unprotected = await find(`
      select n.nspname || '.' || t.relname as name from pg_class t join pg_namespace n on n.oid = t.relnamespace
      where n.nspname in ('club', 'identity') and t.relkind in ('r', 'p')
        and not (t.relrowsecurity and t.relforcerowsecurity
          and exists (select 1 from pg_policy p where p.polrelid = t.oid))`)
    expect(unprotected).toEqual([])
  })

  it('begins every primary key and unique constraint of the club with club_id', async () => {
    const plain = await find(`
      select t.relname || ' ' || i.relname as name from ${clubTables.replace(
        'where',
        `
        join pg_index x on x.indrelid = t.oid join pg_class i on i.oid = x.indexrelid where`,
      )}
        and (x.indisunique or x.indisprimary)
        and (select attname from pg_attribute where attrelid = t.oid and attnum = x.indkey[0]) <> 'club_id'`)
    expect(plain).toEqual([])
  })

  it('gives every table of the club a primary key', async () => {
    const keyless = await find(`
      select t.relname as name from ${clubTables}
        and not exists (select 1 from pg_constraint c where c.conrelid = t.oid and c.contype = 'p')`)
    expect(keyless).toEqual([])
  })

  it('carries club_id in every foreign key between tables of the club', async () => {
    const crossing = await find(`
      select c.conname as name from pg_constraint c
      where c.contype = 'f' and c.connamespace = 'club'::regnamespace
        and c.confrelid in (select t.oid from ${clubTables})
        and not (${columnOf(1, 'conkey', 'conrelid')} = 'club_id'
             and ${columnOf(1, 'confkey', 'confrelid')} = 'club_id')`)
    expect(crossing).toEqual([])
  })

  it('leaves no table to web or worker, and lets neither skip row-level security', async () => {
    const owned = await find(`
      select t.relname as name from pg_class t join pg_roles r on r.oid = t.relowner
      where r.rolname in ('underfoot_web', 'underfoot_worker', 'underfoot_identity')`)
    const exempt = await find(`
      select rolname as name from pg_roles where rolname like 'underfoot%' and (rolsuper or rolbypassrls)`)
    expect([...owned, ...exempt]).toEqual([])
  })
})
