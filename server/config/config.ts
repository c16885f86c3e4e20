import { z } from 'zod'
import { developmentSecret, keys, type Keys } from './keys.ts'

type Settings = { [K in keyof Keys]: z.output<Keys[K]['schema']> }

/** Settings of one process. `databaseUrl` is that of its own role. */
export interface Config extends Omit<Settings, 'ownerUrl' | 'webUrl' | 'workerUrl'> {
  databaseUrl: string
}

/** Thrown where the environment cannot be used; the message names every wrong setting. */
export class ConfigProblem extends Error {
  override name = 'ConfigProblem'
}

export type DatabaseRole = 'owner' | 'web' | 'worker'
export type Environment = Readonly<Record<string, string | undefined>>

/** Reads and checks the environment for a process of the given role. */
export function loadConfig(role: DatabaseRole, environment: Environment = process.env): Config {
  const { ownerUrl, webUrl, workerUrl, ...settings } = parseSettings(environment)
  const databaseUrl = { owner: ownerUrl, web: webUrl, worker: workerUrl }[role]
  const problems = settings.mode === 'production' ? productionProblems(role, settings) : []
  if (!databaseUrl) problems.push(`${keys[`${role}Url`].env} is not set: ${keys[`${role}Url`].says}`)
  if (problems.length > 0 || !databaseUrl) throw new ConfigProblem(problems.join('\n'))
  return { ...settings, databaseUrl }
}

/** Reads and checks every setting; an empty variable counts as not set. */
export function parseSettings(environment: Environment = process.env): Settings {
  const shape = Object.fromEntries(Object.values(keys).map(({ env, schema }) => [env, schema]))
  const given = Object.fromEntries(
    Object.values(keys).map(({ env }) => [env, environment[env] === '' ? undefined : environment[env]]),
  )
  const parsed = z.object(shape).safeParse(given)
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`)
    throw new ConfigProblem(lines.join('\n'))
  }
  return Object.fromEntries(
    Object.entries(keys).map(([name, { env }]) => [name, parsed.data[env]]),
  ) as unknown as Settings
}

/** What a role may not do without in production. The owner only migrates, and needs nothing but its database. */
function productionProblems(role: DatabaseRole, settings: Omit<Settings, `${DatabaseRole}Url`>): string[] {
  if (role === 'owner') return []
  const problems: string[] = []
  if (role === 'web' && settings.sessionSecret === developmentSecret) {
    problems.push('SESSION_SECRET is not set: in production it must be a secret of your own.')
  }
  if (role === 'web' && settings.client === 'vite') problems.push('CLIENT=vite is for development only.')
  if (role === 'web' && settings.trustedProxies === 0) {
    problems.push(
      'TRUSTED_PROXIES must count the proxy that speaks https for us: without it nobody can sign in.',
    )
  }
  if (role === 'worker' && !settings.smtpUrl) {
    problems.push('SMTP_URL is not set: in production mail goes to a real server.')
  }
  if (settings.paymentServiceUrl) {
    problems.push(
      'PAYMENT_SERVICE_URL is for development only: in production money moves at the hosted service.',
    )
  }
  if (settings.stripeKey && !settings.stripeWebhookSecret) {
    problems.push('STRIPE_WEBHOOK_SECRET is not set: without it no event of the payment service is believed.')
  }
  if (!settings.appUrl.startsWith('https://')) {
    problems.push('APP_URL must begin with https:// in production: passwords and cookies travel to it.')
  }
  return problems
}
