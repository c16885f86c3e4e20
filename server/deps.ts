import type { Logger } from 'pino'
import type { Config } from './config/config.ts'
import type { Database } from './db/database.ts'

/** What every part of a process is given, so that a test can give something else. */
export interface Deps {
  config: Config
  db: Database
  log: Logger
  clock: () => Date
}
