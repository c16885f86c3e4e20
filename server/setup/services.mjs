const tsx = ['--import', 'tsx']
const tsxWatch = ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false']

/**
 * The processes of the product, as `keepRunning` takes them.
 * @typedef {import('./processes.mjs').Service} Service
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} reload
 * @returns {Service}
 */
export function webService(env, reload) {
  const args = [...(reload ? tsxWatch : tsx), 'server/main.ts']
  return { name: 'web', args, env: { ...env, CLIENT: reload ? 'vite' : 'built' }, showOutput: reload }
}

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} reload
 * @returns {Service}
 */
export function workerService(env, reload) {
  return { name: 'worker', args: [...(reload ? tsxWatch : tsx), 'server/worker.ts'], env, showOutput: reload }
}

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {{ smtpPort: number, inboxPort: number }} ports
 * @returns {Service}
 */
export function mailService(env, { smtpPort, inboxPort }) {
  const ports = { MAIL_CATCHER_SMTP_PORT: String(smtpPort), MAIL_CATCHER_INBOX_PORT: String(inboxPort) }
  return {
    name: 'mail',
    args: [...tsx, 'server/fakes/main.ts'],
    env: { ...env, ...ports },
    showOutput: false,
  }
}

/** What the local payment service and the product know each other by; it opens nothing anywhere else. */
export const localPayments = {
  STRIPE_SECRET_KEY: 'sk_test_of_this_machine',
  STRIPE_WEBHOOK_SECRET: 'whsec_of_this_machine',
}

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {{ port: number, file: string }} where it listens, and keeps its state
 * @returns {Service}
 */
export function paymentService(env, { port, file }) {
  return {
    name: 'payments',
    args: [...tsx, 'server/fakes/payments/main.ts'],
    env: { ...env, PAYMENT_FAKE_PORT: String(port), PAYMENT_FAKE_FILE: file },
    showOutput: false,
  }
}
