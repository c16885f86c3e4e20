import { join } from 'node:path'
import { ensureClient } from './client-build.mjs'
import { openDatabase } from './database.mjs'
import { demoAccountLines, ensureDemo } from './demo.mjs'
import { migrate } from './migrations.mjs'
import { localFolder } from './paths.mjs'
import { freePort, lastingPort } from './ports.mjs'
import { SetUpProblem, endWith, step } from './problem.mjs'
import { keepRunning } from './processes.mjs'
import { untilReady } from './readiness.mjs'
import { localPayments, mailService, paymentService, webService, workerService } from './services.mjs'
import { productEnvironment } from './settings.mjs'
import { onStop, stopAll } from './stopping.mjs'
import { welcome } from './welcome.mjs'

/**
 * Starts everything, in order, and says where it is to be found.
 * @param {import('./settings.mjs').Settings} settings
 * @param {{ reload: boolean }} options with `reload`, what changes in the sources shows without a new start
 */
export async function startProduct(settings, { reload }) {
  const urls = await openDatabase(settings)
  step('Bringing the database up to date')
  await migrate(urls.owner)
  const mail = settings.smtpUrl ? undefined : { smtpPort: await freePort(), inboxPort: await freePort() }
  const smtpUrl = settings.smtpUrl ?? `smtp://127.0.0.1:${mail?.smtpPort}`
  const payments =
    settings.production || settings.hostedPayments
      ? undefined
      : {
          port: await lastingPort(join(localFolder(), 'payments.port')),
          file: join(localFolder(), 'payments.json'),
        }
  const paymentUrl = payments && `http://127.0.0.1:${payments.port}`
  const env = productEnvironment(settings, {
    urls,
    smtpUrl,
    payments: paymentUrl ? { ...localPayments, PAYMENT_SERVICE_URL: paymentUrl } : {},
  })
  if (!settings.production) await ensureDemo(urls, env, { disposable: !settings.database })
  if (!reload) await ensureClient()

  const services = [workerService(env, reload), webService(env, reload)]
  if (mail) services.unshift(mailService(env, mail))
  if (payments) services.unshift(paymentService(env, payments))
  step(`Starting ${services.map(({ name }) => name).join(', ')}`)
  for (const service of services) await onStop(keepRunning(service, giveUp).stop)
  await untilReady(settings.port)
  const accounts = settings.production ? [] : await demoAccountLines(urls)
  console.log(welcome(settings, { inboxPort: mail?.inboxPort, paymentUrl }, accounts))
}

/**
 * @param {string} name of the service
 * @param {string} log where it wrote
 */
async function giveUp(name, log) {
  await stopAll()
  endWith(new SetUpProblem(`The ${name} process keeps ending by itself; ${log} says why.`))
}
