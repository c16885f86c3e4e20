import { spawn, type ChildProcess } from 'node:child_process'
import { endsWithStarter } from '../../server/setup/parent-death.mjs'
import { pause } from '../../server/setup/pause.mjs'
import { freePort } from '../../server/setup/ports.mjs'
import { localPayments } from '../../server/setup/services.mjs'
import type { TestCluster } from '../../server/setup/test-cluster.mjs'
import { createTestDatabase, type TestDatabase } from './database.ts'

/** The whole product, as it runs for a club: real processes on a database of their own. */
export interface Product {
  url: string
  /** Where the mail catcher shows what was sent. */
  inboxUrl: string
  /** The local payment service, where one was asked for. */
  paymentsUrl: string | null
  database: TestDatabase
  /** The environment of its processes, for a command run beside them. */
  env: NodeJS.ProcessEnv
  /** Starts one more worker, for a test that kills one. */
  startWorker: () => ChildProcess
  /** What its processes wrote so far. */
  output: () => string
  stop: () => Promise<void>
}

export interface ProductOptions {
  /** Fills the database before the first process starts. */
  prepare?: (env: NodeJS.ProcessEnv) => Promise<void>
  /** Starts the local payment service as well, and sells by it. */
  payments?: boolean
  /** Where it is not Vitest that runs. */
  cluster?: TestCluster
}

const readyMs = 30_000

/**
 * Starts web, worker and mail catcher on a clone of the migrated database. Call it in `beforeAll`, and `stop`
 * in `afterAll`; the kernel ends the processes where a killed test could not.
 */
export async function startProduct({ cluster, prepare, payments }: ProductOptions = {}): Promise<Product> {
  const database = await createTestDatabase(cluster)
  const ports = { web: await freePort(), smtp: await freePort(), inbox: await freePort() }
  const paymentPort = payments ? await freePort() : null
  const env = { ...environmentOf(database, ports), ...(paymentPort && sellingBy(paymentPort)) }
  const children: ChildProcess[] = []
  let output = ''
  const start = (file: string) => {
    const [program = '', ...args] = [...endsWithStarter('KILL'), process.execPath, '--import', 'tsx', file]
    const child = spawn(program, args, { env, stdio: ['ignore', 'pipe', 'pipe'] })
    for (const stream of [child.stdout, child.stderr]) stream.on('data', (text) => (output += String(text)))
    children.push(child)
    return child
  }
  const stop = async () => {
    await Promise.all(children.map(endChild))
    await database.drop()
  }
  const url = `http://localhost:${ports.web}`
  try {
    await prepare?.(env)
    if (payments) start('server/fakes/payments/main.ts')
    for (const file of ['server/fakes/main.ts', 'server/main.ts', 'server/worker.ts']) start(file)
    await untilOk(`${url}/readyz`, () => output)
  } catch (error) {
    await stop()
    throw error
  }
  const inboxUrl = `http://localhost:${ports.inbox}`
  return {
    paymentsUrl: paymentPort ? `http://127.0.0.1:${paymentPort}` : null,
    url,
    inboxUrl,
    database,
    env,
    startWorker: () => start('server/worker.ts'),
    output: () => output,
    stop,
  }
}

const sellingBy = (port: number) => ({
  ...localPayments,
  PAYMENT_SERVICE_URL: `http://127.0.0.1:${port}`,
  PAYMENT_FAKE_PORT: String(port),
})

function environmentOf(
  database: TestDatabase,
  ports: { web: number; smtp: number; inbox: number },
): NodeJS.ProcessEnv {
  return {
    ...process.env,
    NODE_ENV: 'test',
    PORT: String(ports.web),
    APP_URL: `http://localhost:${ports.web}`,
    SMTP_URL: `smtp://127.0.0.1:${ports.smtp}`,
    MAIL_CATCHER_SMTP_PORT: String(ports.smtp),
    MAIL_CATCHER_INBOX_PORT: String(ports.inbox),
    DATABASE_OWNER_URL: database.ownerUrl,
    DATABASE_WEB_URL: database.webUrl,
    DATABASE_WORKER_URL: database.workerUrl,
  }
}

async function endChild(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return
  const ended = new Promise((done) => child.once('exit', done))
  child.kill('SIGKILL')
  await ended
}

async function untilOk(url: string, output: () => string): Promise<void> {
  const end = Date.now() + readyMs
  while (Date.now() < end) {
    const response = await fetch(url).catch(() => undefined)
    if (response?.ok) return
    await pause()
  }
  throw new Error(`The product was not ready in ${readyMs} ms. Its processes wrote:\n${output()}`)
}
