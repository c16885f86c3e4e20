import { parseSettings } from '../config/config.ts'
import { createLog } from '../integrations/log.ts'
import { stopOnSignal } from '../integrations/stop-on-signal.ts'
import { startMailCatcher } from './mail-catcher.ts'

const { mode, logLevel, catcherSmtpPort, catcherInboxPort } = parseSettings()
const log = createLog(logLevel)

if (mode === 'production') {
  log.fatal('NODE_ENV is production: mail is never caught there. Set SMTP_URL to a mail server.')
  process.exit(1)
}
const catcher = await startMailCatcher({ smtp: catcherSmtpPort, inbox: catcherInboxPort })
log.info({ smtp: catcher.smtpUrl, inbox: catcher.inboxUrl }, 'mail catcher is listening')
stopOnSignal(log, () => catcher.stop())
