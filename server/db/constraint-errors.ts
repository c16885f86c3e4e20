import { DrizzleQueryError } from 'drizzle-orm'
import pg from 'pg'

/** The database's own error inside whatever wraps it, if it is one. */
export function databaseErrorOf(error: unknown): pg.DatabaseError | null {
  if (error instanceof pg.DatabaseError) return error
  return error instanceof DrizzleQueryError ? databaseErrorOf(error.cause) : null
}

/**
 * Runs a write and turns the failure of a named constraint into the error that a person understands:
 * `await named({ squads_name: () => nameTaken() }, tx.insert(…))`.
 */
export async function named<T>(errors: Record<string, () => Error>, write: PromiseLike<T>): Promise<T> {
  try {
    return await write
  } catch (error) {
    const constraint = databaseErrorOf(error)?.constraint
    const makeError = constraint ? errors[constraint] : undefined
    throw makeError ? makeError() : error
  }
}
