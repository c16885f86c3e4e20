import { parseSettings } from '../../config/config.ts'
import { createLog } from '../../integrations/log.ts'
import { stopOnSignal } from '../../integrations/stop-on-signal.ts'
import { startPaymentService } from './service.ts'

const {
  mode,
  logLevel,
  port: webPort,
  stripeWebhookSecret,
  paymentFakePort,
  paymentFakeFile,
} = parseSettings()
const log = createLog(logLevel)

if (mode === 'production') {
  log.fatal('NODE_ENV is production: the local payment service never runs there. Use keys of the hosted one.')
  process.exit(1)
}
const service = await startPaymentService({
  port: paymentFakePort,
  // Past whatever stands before the web process: both run on this machine.
  webhookUrl: `http://127.0.0.1:${webPort}/api/payments/events`,
  webhookSecret: stripeWebhookSecret ?? 'whsec_of_this_machine',
  ...(paymentFakeFile && { file: paymentFakeFile }),
})
log.info({ url: service.url }, 'the local payment service is listening')
stopOnSignal(log, () => service.stop())
