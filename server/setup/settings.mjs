import { SetUpProblem } from './problem.mjs'
import { localSecrets } from './secrets.mjs'

const databaseNames = /** @type {const} */ ({
  owner: 'DATABASE_OWNER_URL',
  web: 'DATABASE_WEB_URL',
  worker: 'DATABASE_WORKER_URL',
})

/**
 * What the environment asks of a start.
 * @typedef {object} Settings
 * @property {number} port
 * @property {string} appUrl the address that people see, and that links in mail carry
 * @property {boolean} production
 * @property {string | undefined} smtpUrl
 * @property {boolean} hostedPayments whether a key of the hosted payment service is given
 * @property {import('./roles.mjs').OfRoles | undefined} database of the operator's own, instead of a private one
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @returns {Settings}
 */
export function readSettings(env) {
  const port = Number(env.PORT || 3000)
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new SetUpProblem(`PORT is "${env.PORT}": it has to be a whole number from 1 to 65535.`)
  }
  const production = env.NODE_ENV === 'production'
  const smtpUrl = env.SMTP_URL || undefined
  if (production && !smtpUrl) {
    throw new SetUpProblem(
      'NODE_ENV is production, where mail is never caught: set SMTP_URL to a mail server.',
    )
  }
  if (production && !env.SESSION_SECRET) {
    throw new SetUpProblem(
      'NODE_ENV is production: set SESSION_SECRET to a long random text that all web processes share.',
    )
  }
  return {
    port,
    production,
    smtpUrl,
    hostedPayments: Boolean(env.STRIPE_SECRET_KEY),
    appUrl: env.APP_URL || `http://localhost:${port}`,
    database: ownDatabase(env),
  }
}

/** @param {NodeJS.ProcessEnv} env */
function ownDatabase(env) {
  const missing = Object.values(databaseNames).filter((name) => !env[name])
  if (missing.length === Object.keys(databaseNames).length) return undefined
  if (missing.length > 0) {
    throw new SetUpProblem(
      `${missing.join(' and ')} ${missing.length === 1 ? 'is' : 'are'} not set: a database of your own needs all three addresses, a private one none.`,
    )
  }
  return {
    owner: env[databaseNames.owner] ?? '',
    web: env[databaseNames.web] ?? '',
    worker: env[databaseNames.worker] ?? '',
  }
}

/**
 * The environment of every process of the product: all it is told, it is told here.
 * @param {Settings} settings
 * @param {{ urls: import('./roles.mjs').OfRoles, smtpUrl: string, payments?: NodeJS.ProcessEnv }} found
 * @returns {NodeJS.ProcessEnv}
 */
export function productEnvironment(settings, { urls, smtpUrl, payments }) {
  return {
    ...process.env,
    NODE_ENV: process.env.NODE_ENV || 'development',
    PORT: String(settings.port),
    APP_URL: settings.appUrl,
    SMTP_URL: smtpUrl,
    ...payments,
    SESSION_SECRET: process.env.SESSION_SECRET || localSecrets().session,
    [databaseNames.owner]: urls.owner,
    [databaseNames.web]: urls.web,
    [databaseNames.worker]: urls.worker,
  }
}
